import { createApiToken } from '@/db/api-token-store';
import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import { createLaboratory } from '@/db/laboratory-store';
import { addMembership } from '@/db/membership-store';
import { createUser } from '@/db/user-store';
import { endOfDay } from '@/lib/schemas/tokens';
import { TOKEN_PREFIX } from '@/lib/services/tokens';
import { hashToken } from '@/lib/token-hash';
import { tokenBody } from '../generate/codes';
import type { DemoLaboratory } from '../scenario/laboratories';
import {
  ADMINISTRATOR,
  COORDINATORS,
  domainOf,
  PASSWORDS,
  REVIEWERS,
  SHARED_ANALYST,
  staffOf,
  type DemoPerson,
} from '../scenario/people';
import { SENDS_BY_TOKEN, TOKEN_HOLDERS } from '../scenario/telling-events';
import type { Calendar } from '../story/calendar';
import { atMoment } from '@/db/clock';

export type PasswordHashes = Readonly<Record<keyof typeof PASSWORDS, string>>;

export interface Member {
  laboratory: DemoLaboratory;
  id: number;
  managerId: number;
  analystId: number;
  tokenId: number | null;
}

export interface Cast {
  administratorId: number;
  coordinatorIds: readonly [number, number];
  reviewerIds: readonly [number, number];
  members: readonly Member[];
}

const FOUNDED = -1230;
const TOKENS_MADE = -400;
/** Within the two years that a token may live. */
const TOKENS_END = 300;

export function tokenText(laboratory: string): string {
  return TOKEN_PREFIX + tokenBody(laboratory);
}

class CastWriter {
  constructor(
    private readonly trx: Db,
    private readonly hashes: PasswordHashes,
  ) {}

  async person(person: DemoPerson, laboratoryId: number | null): Promise<number> {
    const { trx } = this;
    const passwordHash = this.hashes[person.role];
    const userId = await createUser(trx, { email: person.email, name: person.name, passwordHash });
    await addMembership(trx, { userId, laboratoryId, role: person.role });
    return userId;
  }

  async laboratory(laboratory: DemoLaboratory, administratorId: number): Promise<Member> {
    const { trx } = this;
    const { name, kind, town } = laboratory;
    const contactEmail = `quality@${domainOf(laboratory)}`;
    const id = await createLaboratory(trx, { name, kind, town, contactEmail, isActive: true });
    await addAuditEntry(trx, {
      userId: administratorId,
      laboratoryId: id,
      action: 'laboratory.created',
      detail: name,
    });
    const staff = staffOf(laboratory);
    const managerId = await this.person(staff.lab_manager, id);
    const analystId = await this.person(staff.analyst, id);
    return { laboratory, id, managerId, analystId, tokenId: null };
  }

  async sharedAnalyst(members: readonly Member[]): Promise<void> {
    const idOf = (name: string) => members.find(({ laboratory }) => laboratory.name === name)?.id ?? null;
    const userId = await this.person(SHARED_ANALYST, idOf(SHARED_ANALYST.analystAt));
    const laboratoryId = idOf(SHARED_ANALYST.managerAt);
    await addMembership(this.trx, { userId, laboratoryId, role: 'lab_manager' });
  }

  async token({ laboratory, id, managerId }: Member, lastDay: string): Promise<number> {
    const token = tokenText(laboratory.name);
    const apiTokenId = await createApiToken(this.trx, {
      laboratoryId: id,
      name: 'Laboratory system',
      tokenHash: hashToken(token),
      lastFour: token.slice(-4),
      createdBy: managerId,
      expiresAt: endOfDay(lastDay),
    });
    await addAuditEntry(this.trx, {
      userId: managerId,
      apiTokenId,
      laboratoryId: id,
      action: 'token.created',
      detail: 'Laboratory system',
    });
    return apiTokenId;
  }
}

/** Writes the people and the laboratories, long before the first round, and the tokens of a few. */
export async function writeCast(
  trx: Db,
  calendar: Calendar,
  laboratories: readonly DemoLaboratory[],
  hashes: PasswordHashes,
): Promise<Cast> {
  const writer = new CastWriter(trx, hashes);
  return atMoment(calendar.moment(FOUNDED), async () => {
    const administratorId = await writer.person(ADMINISTRATOR, null);
    const coordinatorIds = [
      await writer.person(COORDINATORS[0], null),
      await writer.person(COORDINATORS[1], null),
    ] as const;
    const reviewerIds = [
      await writer.person(REVIEWERS[0], null),
      await writer.person(REVIEWERS[1], null),
    ] as const;
    const members: Member[] = [];
    for (const laboratory of laboratories) members.push(await writer.laboratory(laboratory, administratorId));
    await writer.sharedAnalyst(members);
    return { administratorId, coordinatorIds, reviewerIds, members };
  });
}

/** The tokens are made while the rounds go on. */
export function tokenHappenings(calendar: Calendar, cast: Cast, hashes: PasswordHashes) {
  const holders = [...TOKEN_HOLDERS, SENDS_BY_TOKEN];
  return cast.members
    .filter(({ laboratory }) => holders.includes(laboratory.name))
    .map((member) => ({
      moment: calendar.moment(TOKENS_MADE),
      tell: async (trx: Db) => {
        member.tokenId = await new CastWriter(trx, hashes).token(member, calendar.date(TOKENS_END));
      },
    }));
}
