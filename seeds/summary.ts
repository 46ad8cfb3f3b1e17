import { demoLaboratories, FEWEST_LABORATORIES, scopeOf } from './scenario/laboratories';
import {
  ADMINISTRATOR,
  COORDINATORS,
  LISTED_LABORATORIES,
  PASSWORDS,
  REVIEWERS,
  SHARED_ANALYST,
  staffOf,
  type DemoPerson,
} from './scenario/people';
import { ROUNDS } from './scenario/rounds';
import { TOKEN_HOLDERS } from './scenario/telling-events';
import { tokenText } from './write/cast';

export interface DemoSummary {
  signIns: { role: string; name: string; email: string; password: string }[];
  /** For a first upload: an item and a measurand that the laboratory has not reported yet in the open round. */
  tokens: { laboratory: string; round: string; item: string; measurand: string; token: string }[];
  /** Null when the installation holds no demonstration. */
  openRound: string | null;
  seeded: boolean;
}

function signIn({ role, name, email }: DemoPerson): DemoSummary['signIns'][number] {
  return { role, name, email, password: PASSWORDS[role] };
}

/** Who may sign in and which tokens may be tried; the same after every seeding. */
export function demoSummary({ seeded }: { seeded: boolean }): DemoSummary {
  const laboratories = demoLaboratories(FEWEST_LABORATORIES);
  const named = (names: readonly string[]) =>
    names.flatMap((name) => laboratories.filter((laboratory) => laboratory.name === name));
  const staff = named(LISTED_LABORATORIES).flatMap((laboratory) => {
    const { lab_manager, analyst } = staffOf(laboratory);
    return [lab_manager, analyst];
  });
  const open = ROUNDS.find(({ state }) => state === 'open');
  if (!open) throw new Error('the story has no open round');
  const tokens = named(TOKEN_HOLDERS).flatMap((laboratory) =>
    open.items.slice(0, 1).map((item) => ({
      laboratory: laboratory.name,
      round: open.slug,
      item: item.code,
      measurand: scopeOf(laboratory).find((code) => Object.hasOwn(item.measurands, code)) ?? '',
      token: tokenText(laboratory.name),
    })),
  );
  const people = [ADMINISTRATOR, ...COORDINATORS, ...REVIEWERS, ...staff, SHARED_ANALYST];
  return { signIns: people.map(signIn), tokens, openRound: open.slug, seeded };
}
