import Link from 'next/link';
import { Figures } from '@/components/ui/figures';
import { Signal, type SignalKind } from '@/components/ui/signal';
import { NumberCell, Table, Td, Th } from '@/components/ui/table';
import { formatNumber, showMinus, type ScoreKind } from '@/lib/format';
import { SCORE_NAMES } from './score-names';

/** One measurand of a published round with the laboratory's own figures. */
export interface OwnScoreRow {
  roundMeasurandId: number;
  item: string;
  code: string;
  name: string;
  unit: string;
  decimals: number;
  /** The figure that was scored, or a limit such as "<2.0"; null when nothing was reported. */
  result: number | string | null;
  assigned: number | null;
  assignedUncertainty: number | null;
  sigmaPt: number | null;
  scoreKind: Exclude<ScoreKind, 'p-a'>;
  score: number | null;
  signal: SignalKind;
  dPercent: number | null;
  why?: string;
}

export type OwnScoresTableProps = { round: string; rows: readonly OwnScoreRow[] };

/** Statistics of the round are shown a little finer than results: x_pt one decimal, u and sigma_pt two. */
export const FINER = { assigned: 1, spread: 2 } as const;

export function OwnScoresTable({ round, rows }: OwnScoresTableProps) {
  return (
    <Table caption="Your scores" fullHeight>
      <thead>
        <tr>
          <Th>Measurand</Th>
          <Th numeric className="pr-24.5">
            Score
          </Th>
          <Th numeric>Your result</Th>
          <Th numeric>x_pt</Th>
          <Th numeric>u(x_pt)</Th>
          <Th numeric>sigma_pt</Th>
          <Th>Unit</Th>
          <Th numeric>D%</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.roundMeasurandId}>
            <Th scope="row" className="align-top">
              <Link
                href={`/laboratory/rounds/${round}/scores/${row.roundMeasurandId}`}
                className="text-link relative inline-flex min-h-6 items-center whitespace-nowrap"
              >
                {row.item} {row.code}
                <span className="sr-only">: where it stands</span>
              </Link>
              <span className="block text-sm font-normal text-ink-soft">{row.name}</span>
            </Th>
            <Td numeric className="whitespace-nowrap">
              <span className="mr-2 text-sm text-ink-soft">{SCORE_NAMES[row.scoreKind]}</span>
              <Signal score={row.score} signal={row.signal} kind={row.scoreKind} why={row.why} column />
            </Td>
            <NumberCell value={plainResult(row)} decimals={row.decimals} />
            <NumberCell value={row.assigned} decimals={row.decimals + FINER.assigned} />
            <NumberCell value={row.assignedUncertainty} decimals={row.decimals + FINER.spread} />
            <NumberCell value={row.sigmaPt} decimals={row.decimals + FINER.spread} />
            <Td>{row.unit}</Td>
            <Td numeric>
              <Figures value={row.dPercent} decimals={1} />
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function plainResult({ result, decimals }: OwnScoreRow): string | null {
  if (result === null) return null;
  return typeof result === 'string' ? showMinus(result) : formatNumber(result, decimals);
}
