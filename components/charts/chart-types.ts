import type { ScoreKind } from '@/lib/format';
import type { SignalKind } from '@/components/ui/signal';

export type ScorePoint = { code: string; score: number | null; signal: SignalKind; own?: boolean };
export type ResultPoint = { code: string; value: number; signal?: SignalKind; own?: boolean };
export type TrendPoint = {
  key: string;
  label: string;
  score: number | null;
  signal: SignalKind;
  note?: string;
};
export type ScoreName = { name: string; kind: ScoreKind };
export type AssignedValue = { value: number; sigmaPt: number };
export type { SignalKind };
