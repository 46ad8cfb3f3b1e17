import { randomBytes } from 'node:crypto';
import type { Db } from '@/db/connection';
import { createApiToken } from '@/db/api-token-store';
import { createLaboratory } from '@/db/laboratory-store';
import { findRound } from '@/db/round-store';
import { listParticipants } from '@/db/views/participants-view';
import type { Actor } from '@/lib/rules/roles';
import { measurandSchema } from '@/lib/schemas/schemes';
import { roundSchema } from '@/lib/schemas/rounds';
import { enrolLaboratories } from '@/lib/services/enrolments';
import { addRound, addTestItem } from '@/lib/services/round-plan';
import { openRound } from '@/lib/services/round-steps';
import { addMeasurand, addScheme, getSchemeWithMeasurands } from '@/lib/services/schemes';
import { hashToken } from '@/lib/token-hash';

/** Stands for a coordinator where services ask who acts; the fixture has no people of its own. */
export const NOBODY: Actor = {
  userId: null,
  apiTokenId: null,
  name: 'Fixture',
  email: 'fixture@fixture.example',
  memberships: [{ role: 'coordinator', laboratoryId: null, laboratoryName: null }],
  laboratoryId: null,
};

export interface FixtureLaboratory {
  id: number;
  name: string;
  token: string;
  participantCode: string;
}

export interface FixtureRound {
  id: number;
  slug: string;
  laboratories: FixtureLaboratory[];
}

const DAY_MS = 86_400_000;

function inDays(days: number): string {
  return new Date(Date.now() + days * DAY_MS).toISOString();
}

export async function makeLaboratory(
  connection: Db,
  name: string,
): Promise<Omit<FixtureLaboratory, 'participantCode'>> {
  const id = await createLaboratory(connection, {
    name,
    kind: 'other',
    town: '',
    contactEmail: null,
    isActive: true,
  });
  const token = `assize_${randomBytes(20).toString('hex')}`;
  await createApiToken(connection, {
    laboratoryId: id,
    name: 'fixture',
    tokenHash: hashToken(token),
    lastFour: token.slice(-4),
    createdBy: null,
    expiresAt: inDays(30),
  });
  return { id, name, token };
}

/** An open round with items M1 and M2, measurands AFT (ug/kg) and DON (mg/kg) in each, and laboratories with tokens. */
export async function makeOpenRound(connection: Db, laboratoryCount: number): Promise<FixtureRound> {
  const mark = randomBytes(4).toString('hex');
  const scheme = await addScheme(NOBODY, { name: `Fixture scheme ${mark}`, description: '' });
  const common = { decimals: '2', sigmaRule: 'percent', sigmaPercent: '25' };
  await addMeasurand(
    NOBODY,
    scheme.slug,
    measurandSchema.parse({ ...common, code: 'AFT', name: 'Aflatoxins, total', unit: 'ug/kg' }),
  );
  await addMeasurand(
    NOBODY,
    scheme.slug,
    measurandSchema.parse({ ...common, code: 'DON', name: 'Deoxynivalenol', unit: 'mg/kg' }),
  );
  const { measurands } = await getSchemeWithMeasurands(scheme.slug);
  const { slug } = await addRound(
    NOBODY,
    scheme.slug,
    roundSchema.parse({
      name: `Fixture round ${mark}`,
      opensAt: inDays(-1),
      dispatchAt: inDays(-1),
      closesAt: inDays(10),
      publishAt: inDays(20),
    }),
  );
  const ids = measurands.map((measurand) => measurand.id);
  for (const code of ['M1', 'M2']) {
    await addTestItem(NOBODY, slug, { code, name: `Maize ${code}`, matrix: 'maize', handling: '' }, ids);
  }
  await openRound(NOBODY, slug);
  const laboratories = [];
  for (let number = 1; number <= laboratoryCount; number += 1) {
    laboratories.push(await makeLaboratory(connection, `Fixture laboratory ${mark} ${number}`));
  }
  await enrolLaboratories(
    NOBODY,
    slug,
    laboratories.map((laboratory) => laboratory.id),
    'enrolled',
  );
  const round = await findRound(connection, slug);
  if (!round) throw new Error('the fixture round is missing');
  const codes = new Map(
    (await listParticipants(connection, round.id)).map((entry) => [
      entry.laboratoryId,
      entry.participantCode,
    ]),
  );
  return {
    id: round.id,
    slug,
    laboratories: laboratories.map((laboratory) => ({
      ...laboratory,
      participantCode: codes.get(laboratory.id) ?? '',
    })),
  };
}
