export interface LogEntry {
  action: string;
  outcome: 'done' | 'refused';
  detail: string;
  userName: string | null;
  isStaff: boolean;
  isToken: boolean;
  participantCode: string | null;
}

const WORDS: Record<string, string> = {
  'round.created': 'planned the round',
  'round.changed': 'changed dates or instructions',
  'round.opened': 'opened the round',
  'round.closed': 'closed the round',
  'round.evaluated': 'evaluated the round',
  'round.published': 'published the scores',
  'round.cancelled': 'cancelled the round',
  'item.created': 'added a test item',
  'item.changed': 'changed a test item',
  'item.removed': 'removed a test item',
  'measurand.added': 'added a measurand to an item',
  'measurand.planned': 'changed how a measurand is evaluated',
  'measurand.removed': 'removed a measurand from an item',
  'enrolment.invited': 'invited',
  'enrolment.enrolled': 'enrolled',
  'enrolment.declined': 'declined for',
  'enrolment.withdrawn': 'withdrew',
  'items.received': 'confirmed that the items arrived',
  'results.submitted': 'sent results',
  'results.amended': 'sent results that replace earlier ones',
  'results.refused': 'sent a file that was refused',
  'results.loaded': 'loaded results of a whole round',
  'key.viewed': 'looked at who is behind the codes',
  'evaluation.signed': 'signed the evaluation',
  'evaluation.returned': 'returned the evaluation',
};

/** What else happens in an installation, for the log of all of it. */
const INSTALLATION_WORDS: Record<string, string> = {
  ...WORDS,
  'enrolment.invited': 'invited a laboratory to a round',
  'enrolment.enrolled': 'enrolled a laboratory in a round',
  'enrolment.declined': 'declined an invitation to a round',
  'enrolment.withdrawn': 'withdrew a laboratory from a round',
  'scheme.created': 'planned a scheme',
  'scheme.changed': 'changed a scheme',
  'measurand.created': 'added a measurand to a scheme',
  'measurand.changed': 'changed a measurand of a scheme',
  'laboratory.created': 'added a laboratory',
  'laboratory.changed': 'changed the details of a laboratory',
  'laboratory.chosen': 'changed to another laboratory',
  'person.changed': 'changed the details of a person',
  'person.disabled': 'closed an account',
  'person.enabled': 'opened an account again',
  'person.link-sent': 'sent a link to choose a password',
  'person.role-given': 'gave a role',
  'person.role-taken': 'took a role away',
  'password.changed': 'changed a password',
  'password.reset-asked': 'asked for a link to choose a new password',
  'mail.sent-again': 'sent a message again',
  'token.created': 'made a token',
  'token.revoked': 'revoked a token',
  'request.refused': 'asked for what the role does not allow',
  'set-up': 'set up the installation',
  'sign-in': 'signed in',
  'sign-out': 'signed out',
  'sign-out.everywhere': 'signed out everywhere',
};

/** A line of the installation's log in words; an action that has none is named by its code. */
export function installationWords(action: string): string {
  return INSTALLATION_WORDS[action] ?? `did ${action}`;
}

/** Who it was: people of the provider by name, people of a laboratory only by its code, or not even that. */
export function whoWords(entry: LogEntry): string {
  if (entry.isStaff && entry.userName) return entry.userName;
  if (entry.participantCode === null) return 'Someone';
  return entry.isToken
    ? `A program of participant ${entry.participantCode}`
    : `Participant ${entry.participantCode}`;
}

const OWN_WORDS: Record<string, string> = {
  'enrolment.enrolled': 'accepted to take part',
  'enrolment.declined': 'declined to take part',
  'enrolment.withdrawn': 'withdrew',
};

export function actionWords(entry: LogEntry): string {
  const words = WORDS[entry.action] ?? `did ${entry.action}`;
  if (!entry.action.startsWith('enrolment.')) return words;
  if (!entry.isStaff) return OWN_WORDS[entry.action] ?? words;
  return entry.participantCode === null
    ? `${words} a participant`
    : `${words} participant ${entry.participantCode}`;
}
