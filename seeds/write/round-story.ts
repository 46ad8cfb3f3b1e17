import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import { createEnrolment } from '@/db/enrolment-store';
import { createSignOff, findLatestEvaluation } from '@/db/evaluation-store';
import { getRoundById, moveRound, type Round, type RoundState } from '@/db/round-store';
import { keepEvaluation } from '@/lib/services/evaluate-round';
import { getResultsPlan } from '@/lib/services/results-plan';
import { participantCodes } from '../generate/codes';
import { fateOf } from '../scenario/telling-events';
import type { DemoRound } from '../scenario/rounds';
import type { Calendar } from '../story/calendar';
import type { Happening } from '../story/happening';
import type { Cast } from './cast';
import { participation } from './participation';
import { roundDays } from './round-days';
import { planRound } from './round-plan';
import { RoundRecord } from './round-record';
import type { WrittenScheme } from './schemes';

const ORDER: readonly RoundState[] = ['draft', 'open', 'closed', 'evaluated', 'published'];
const SIGNING_COMMENT = 'Figures recomputed from the kept files for two measurands; they agree.';

/** Tells the life of one round: the provider's steps here, the laboratories' part in participation.ts. */
class RoundStory {
  private readonly record: RoundRecord;
  private readonly userId: number;
  private readonly reviewerId: number;

  constructor(
    private readonly calendar: Calendar,
    private readonly cast: Cast,
    private readonly round: DemoRound,
    private readonly scheme: WrittenScheme,
  ) {
    this.record = new RoundRecord(round);
    this.userId = cast.coordinatorIds[round.coordinator];
    this.reviewerId = cast.reviewerIds[round.reviewer];
  }

  happenings(): Happening[] {
    const { calendar, cast, record, round } = this;
    const days = roundDays(round);
    const steps: [
      from: RoundState,
      day: number,
      hour: number,
      tell: (trx: Db, moment: string) => Promise<void>,
    ][] = [
      ['draft', days.created, 9, (trx) => this.plan(trx)],
      ['draft', days.enrolled, 9, (trx) => this.enrol(trx)],
      ['open', days.opens, 8, (trx, openedAt) => this.move(trx, 'open', { openedAt })],
      ['closed', days.closes, 16, (trx, closedAt) => this.move(trx, 'closed', { closedAt })],
      ['evaluated', days.evaluated, 10, (trx, evaluatedAt) => this.evaluate(trx, evaluatedAt)],
      ['published', days.signed, 14, (trx) => this.sign(trx)],
      ['published', days.published, 9, (trx, publishedAt) => this.move(trx, 'published', { publishedAt })],
    ];
    const reached = ORDER.indexOf(round.state);
    const told = steps.filter(([from]) => ORDER.indexOf(from) <= reached);
    const own = told.map(([, day, hour, tell]) => {
      const moment = calendar.moment(day, hour, 20);
      return { moment, tell: (trx: Db) => tell(trx, moment) };
    });
    return [...own, ...cast.members.flatMap((member) => participation(calendar, member, record))];
  }

  private async plan(trx: Db): Promise<void> {
    const { calendar, round, scheme, userId } = this;
    const roundId = await planRound(trx, calendar, { round, scheme, userId });
    this.record.planned(roundId, await getResultsPlan(trx, await getRoundById(trx, roundId)));
  }

  private async enrol(trx: Db): Promise<void> {
    const { cast, record, round, userId } = this;
    const codes = participantCodes(
      round.slug,
      cast.members.map(({ laboratory }) => laboratory.name),
    );
    for (const { laboratory, id: laboratoryId } of cast.members) {
      const fate = fateOf(laboratory.name, round.slug);
      const isInvited = round.state === 'draft' || fate?.state === 'invited' || fate?.state === 'declined';
      const state = isInvited ? 'invited' : 'enrolled';
      const participantCode = codes.get(laboratory.name) ?? '';
      const { roundId } = record;
      const enrolmentId = await createEnrolment(trx, { roundId, laboratoryId, participantCode, state });
      record.enrolled(laboratory.name, enrolmentId);
      await addAuditEntry(trx, { userId, roundId, laboratoryId, action: `enrolment.${state}` });
    }
  }

  private async move(trx: Db, state: 'open' | 'closed' | 'published', stamps: Partial<Round>): Promise<void> {
    const { roundId } = this.record;
    await this.changeState(trx, state, stamps);
    const action = { open: 'round.opened', closed: 'round.closed', published: 'round.published' }[state];
    const version = state === 'published' ? (await findLatestEvaluation(trx, roundId))?.version : null;
    const detail = version ? `evaluation version ${version}` : '';
    await addAuditEntry(trx, { userId: this.userId, roundId, action, detail });
  }

  private async changeState(trx: Db, state: RoundState, stamps: Partial<Round>): Promise<void> {
    const from = ORDER[ORDER.indexOf(state) - 1];
    const isMoved = from && (await moveRound(trx, this.record.roundId, from, { ...stamps, state }));
    if (!isMoved) throw new Error(`${this.round.slug} cannot become ${state}`);
  }

  private async evaluate(trx: Db, moment: string): Promise<void> {
    const { roundId } = this.record;
    const { userId } = this;
    const { version, inputsSha256 } = await keepEvaluation(trx, roundId, { userId, at: moment });
    await this.changeState(trx, 'evaluated', { evaluatedAt: moment });
    const detail = `version ${version}, inputs SHA-256 ${inputsSha256}`;
    await addAuditEntry(trx, { userId, roundId, action: 'round.evaluated', detail });
  }

  private async sign(trx: Db): Promise<void> {
    const { roundId } = this.record;
    const userId = this.reviewerId;
    const evaluation = await findLatestEvaluation(trx, roundId);
    if (!evaluation) throw new Error(`${this.round.slug} has nothing to sign`);
    const evaluationId = evaluation.id;
    await createSignOff(trx, { evaluationId, userId, decision: 'signed', comment: SIGNING_COMMENT });
    const detail = `version ${evaluation.version}`;
    await addAuditEntry(trx, { userId, roundId, action: 'evaluation.signed', detail });
  }
}

export function roundStory(
  calendar: Calendar,
  cast: Cast,
  round: DemoRound,
  scheme: WrittenScheme,
): Happening[] {
  return new RoundStory(calendar, cast, round, scheme).happenings();
}
