const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;
const WORK_BEGINS = 8;

/** Moments counted in days from the day of seeding (UTC), so that the demonstration is always of today. */
export class Calendar {
  private readonly midnight: number;

  constructor(now: Date) {
    this.midnight = Math.floor(now.getTime() / DAY_MS) * DAY_MS;
  }

  /** Day 0 is the day of seeding. */
  moment(day: number, hour = WORK_BEGINS, minute = 0): string {
    return new Date(this.midnight + day * DAY_MS + (hour * 60 + minute) * MINUTE_MS).toISOString();
  }

  date(day: number): string {
    return this.moment(day).slice(0, 10);
  }
}
