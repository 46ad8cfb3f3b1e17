import type { ScoreKind } from '@/lib/format';

export const SCORE_NAMES: Record<Exclude<ScoreKind, 'p-a'>, string> = {
  z: 'z',
  'z-prime': "z'",
  zeta: 'zeta',
  'e-n': 'E_n',
};
