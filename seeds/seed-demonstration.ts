import type { Db } from '@/db/connection';
import { findSetting, setSetting } from '@/db/settings-store';
import { inTransaction } from '@/db/transaction';
import { hasUsers } from '@/db/user-store';
import { hashPassword } from '@/lib/services/password-hash';
import { demoLaboratories, FEWEST_LABORATORIES } from './scenario/laboratories';
import { PASSWORDS } from './scenario/people';
import { ROUNDS } from './scenario/rounds';
import { demoSummary, type DemoSummary } from './summary';
import { Calendar } from './story/calendar';
import { tellInOrder } from './story/happening';
import { tokenHappenings, writeCast, type PasswordHashes } from './write/cast';
import { roundStory } from './write/round-story';
import { writeSchemes } from './write/schemes';

const SEEDED_KEY = 'demonstration_seeded_at';

export interface SeedOptions {
  /** The moment of seeding; every date is counted from its day. */
  now: Date;
  laboratoryCount?: number;
}

async function hashPasswords(): Promise<PasswordHashes> {
  const roles = Object.keys(PASSWORDS) as (keyof typeof PASSWORDS)[];
  const hashes = await Promise.all(roles.map((role) => hashPassword(PASSWORDS[role])));
  return Object.fromEntries(roles.map((role, index) => [role, hashes[index]])) as PasswordHashes;
}

async function tellStory(trx: Db, options: Required<SeedOptions>, hashes: PasswordHashes): Promise<void> {
  const calendar = new Calendar(options.now);
  const cast = await writeCast(trx, calendar, demoLaboratories(options.laboratoryCount), hashes);
  const schemes = await writeSchemes(trx, calendar, cast.coordinatorIds[0]);
  const rounds = ROUNDS.flatMap((round) => {
    const scheme = schemes.get(round.scheme);
    if (!scheme) throw new Error(`there is no scheme ${round.scheme}`);
    return roundStory(calendar, cast, round, scheme);
  });
  await tellInOrder(trx, [...tokenHappenings(calendar, cast, hashes), ...rounds]);
  await setSetting(trx, SEEDED_KEY, options.now.toISOString());
}

/**
 * Writes the demonstration into a database without users, in one transaction: all of it or nothing, so that an
 * interrupted start can begin again. A database that has users is left as it is.
 */
export async function seedDemonstration(connection: Db, options: SeedOptions): Promise<DemoSummary> {
  const laboratoryCount = options.laboratoryCount ?? FEWEST_LABORATORIES;
  if (await hasUsers(connection)) return recallDemonstration(connection);
  const hashes = await hashPasswords();
  const isSeeded = await inTransaction(connection, async (trx) => {
    if (await hasUsers(trx)) return false;
    await tellStory(trx, { ...options, laboratoryCount }, hashes);
    return true;
  });
  return isSeeded ? demoSummary({ seeded: true }) : recallDemonstration(connection);
}

/** What was seeded before; nothing for an installation that was never a demonstration. */
async function recallDemonstration(connection: Db): Promise<DemoSummary> {
  const isDemonstration = (await findSetting(connection, SEEDED_KEY)) !== null;
  if (isDemonstration) return demoSummary({ seeded: false });
  return { signIns: [], tokens: [], openRound: null, seeded: false };
}
