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
