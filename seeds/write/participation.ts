import { addAuditEntry } from '@/db/audit-store';
import { updateEnrolment } from '@/db/enrolment-store';
import type { Db } from '@/db/connection';
import { habitsOf } from '../generate/habits';
import { reportRows } from '../generate/report';
import { resultsCsv } from '../generate/results-csv';
import type { DemoRound } from '../scenario/rounds';
import {
  fateOf,
  mistakesOf,
  NEVER_SENDS,
  SENDS_BY_TOKEN,
  slipsOf,
  TOKEN_HOLDERS,
} from '../scenario/telling-events';
import type { Calendar } from '../story/calendar';
import type { Happening } from '../story/happening';
import { streamFor } from '../story/random';
import type { Member } from './cast';
import { roundDays } from './round-days';
import type { RoundRecord } from './round-record';
import { sendFile } from './submission';

/** Of the laboratories of a past round, those that send; and of the open one, so far. */
const SHARE_SENDING = 0.97;
const SHARE_SO_FAR = 0.72;
const HOURS_BETWEEN_FILES = 2;
const BREAK_DOWN_HOUR = 20;

function sends(name: string, round: DemoRound): boolean {
  if (NEVER_SENDS.includes(name)) return false;
  if (slipsOf(name, round.slug).length > 0 || mistakesOf(name, round.slug).length > 0) return true;
  if (round.state === 'open' && TOKEN_HOLDERS.includes(name)) return false;
  const fate = fateOf(name, round.slug);
  if (fate) return fate.hadSent;
  return streamFor('sends', round.slug, name).chance(round.state === 'open' ? SHARE_SO_FAR : SHARE_SENDING);
}

/** The files a laboratory sends for a round, the last of them the one that counts. */
function filesOf(member: Member, round: DemoRound, analysedOn: string): Uint8Array[] {
  const { laboratory } = member;
  const changes = slipsOf(laboratory.name, round.slug);
  const final = changes.reduce((rows, change) => change(rows), reportRows(laboratory, round, analysedOn));
  const habits = habitsOf(laboratory);
  const earlier = mistakesOf(laboratory.name, round.slug).map((mistake) => mistake(final));
  return [...earlier, final].map((rows) => resultsCsv(rows, habits));
}

function sendings(calendar: Calendar, member: Member, record: RoundRecord): Happening[] {
  const { round } = record;
  const { name } = member.laboratory;
  if (!sends(name, round)) return [];
  const days = roundDays(round);
  const stream = streamFor('sending', round.slug, name);
  const day = stream.integer(days.firstResult + 1, days.lastResult);
  const [hour, minute] = [stream.integer(8, 13), stream.integer(0, 59)];
  return filesOf(member, round, calendar.date(day - 1)).map((bytes, number) => {
    const moment = calendar.moment(day, hour + HOURS_BETWEEN_FILES * number, minute);
    return {
      moment,
      tell: (trx: Db) =>
        sendFile(trx, {
          member,
          round: { id: record.roundId, slug: round.slug },
          enrolmentId: record.enrolmentOf(name),
          plan: record.plan,
          bytes,
          number,
          byToken: name === SENDS_BY_TOKEN && member.tokenId !== null,
          moment,
        }),
    };
  });
}

function itemsReceived(calendar: Calendar, member: Member, record: RoundRecord): Happening {
  const { opens } = roundDays(record.round);
  const stream = streamFor('received', record.round.slug, member.laboratory.name);
  const moment = calendar.moment(
    stream.integer(opens + 1, opens + 2),
    stream.integer(8, 15),
    stream.integer(0, 59),
  );
  return {
    moment,
    tell: async (trx) => {
      await updateEnrolment(trx, record.enrolmentOf(member.laboratory.name), { itemsReceivedAt: moment });
      await addAuditEntry(trx, {
        userId: member.analystId,
        roundId: record.roundId,
        laboratoryId: member.id,
        action: 'items.received',
      });
    },
  };
}

/** How a laboratory declines the invitation or withdraws. */
function departure(calendar: Calendar, member: Member, record: RoundRecord): Happening[] {
  const fate = fateOf(member.laboratory.name, record.round.slug);
  if (!fate || fate.state === 'invited') return [];
  const { state, reason } = fate;
  const days = roundDays(record.round);
  const day = state === 'declined' ? days.enrolled + 1 : days.lastResult;
  const moment = calendar.moment(day, BREAK_DOWN_HOUR);
  return [
    {
      moment,
      tell: async (trx) => {
        await updateEnrolment(trx, record.enrolmentOf(member.laboratory.name), {
          state,
          reason,
          decidedAt: moment,
        });
        await addAuditEntry(trx, {
          userId: member.managerId,
          roundId: record.roundId,
          laboratoryId: member.id,
          action: `enrolment.${state}`,
          detail: reason,
        });
      },
    },
  ];
}

/** What one laboratory does in a round once it is enrolled. */
export function participation(calendar: Calendar, member: Member, record: RoundRecord): Happening[] {
  const fate = fateOf(member.laboratory.name, record.round.slug);
  const leaves = departure(calendar, member, record);
  if (record.round.state === 'draft' || fate?.state === 'invited' || fate?.state === 'declined')
    return leaves;
  return [itemsReceived(calendar, member, record), ...sendings(calendar, member, record), ...leaves];
}
