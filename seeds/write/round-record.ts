import type { ResultsPlan } from '@/lib/results-file';
import type { DemoRound } from '../scenario/rounds';

/** What becomes known of a round while its story is written. */
export class RoundRecord {
  private readonly enrolmentIds = new Map<string, number>();
  private id: number | null = null;
  private resultsPlan: ResultsPlan | null = null;

  constructor(readonly round: DemoRound) {}

  planned(roundId: number, plan: ResultsPlan): void {
    this.id = roundId;
    this.resultsPlan = plan;
  }

  enrolled(laboratory: string, enrolmentId: number): void {
    this.enrolmentIds.set(laboratory, enrolmentId);
  }

  get roundId(): number {
    return this.known(this.id, 'its id');
  }

  get plan(): ResultsPlan {
    return this.known(this.resultsPlan, 'its plan');
  }

  enrolmentOf(laboratory: string): number {
    return this.known(this.enrolmentIds.get(laboratory), `the enrolment of ${laboratory}`);
  }

  private known<T>(value: T | null | undefined, what: string): T {
    if (value === null || value === undefined)
      throw new Error(`${this.round.slug}: ${what} is not written yet`);
    return value;
  }
}
