import type { ReactNode } from 'react';
import { Figures } from '@/components/ui/figures';
import { Table, Td, Th } from '@/components/ui/table';
import type { RobustSummary } from '@/lib/stats/evaluation/types';
import { statisticDecimals } from './score-columns';

export type EstimateFigure = 'median' | 'mad-e' | 'n-iqr' | 'mean' | 'sd' | 'robust-mean' | 'robust-sd';
export type EstimatesTableProps = {
  robust: RobustSummary;
  unit: string;
  decimals: number;
  working?: (figure: EstimateFigure, name: string) => ReactNode;
};

interface Cell {
  figure: EstimateFigure;
  name: string;
  value: number | null;
  reason?: string;
}

function rowsOf({ algorithmA, median, madE, nIqr, mean, sd, reasons }: RobustSummary): {
  title: string;
  location?: Cell;
  scales: Cell[];
}[] {
  return [
    {
      title: 'Algorithm A',
      location: {
        figure: 'robust-mean',
        name: 'x*',
        value: algorithmA?.location ?? null,
        reason: reasons.algorithmA,
      },
      scales: [
        { figure: 'robust-sd', name: 's*', value: algorithmA?.scale ?? null, reason: reasons.algorithmA },
      ],
    },
    {
      title: 'Median',
      location: { figure: 'median', name: 'median', value: median, reason: reasons.median },
      scales: [
        { figure: 'mad-e', name: 'MADe', value: madE, reason: reasons.madE },
        { figure: 'n-iqr', name: 'nIQR', value: nIqr, reason: reasons.nIqr },
      ],
    },
    {
      title: 'Mean',
      location: { figure: 'mean', name: 'mean', value: mean, reason: reasons.mean },
      scales: [{ figure: 'sd', name: 'sd', value: sd, reason: reasons.sd }],
    },
  ];
}

/** Estimates of location and spread side by side, so that a reader sees what a few bad results do to them. */
export function EstimatesTable({ robust, unit, decimals, working }: EstimatesTableProps) {
  const digits = statisticDecimals(decimals);
  return (
    <Table
      caption={`Estimates from ${robust.count} results, in ${unit}`}
      fullHeight
      className="max-w-measure"
    >
      <thead>
        <tr>
          <Th>Estimator</Th>
          <Th>Statistic</Th>
          <Th numeric>Value</Th>
          {working && (
            <Th>
              <span className="sr-only">Working</span>
            </Th>
          )}
        </tr>
      </thead>
      <tbody>
        {rowsOf(robust).flatMap(({ title, location, scales }) =>
          [...(location ? [location] : []), ...scales].map((cell) => (
            <tr key={cell.figure}>
              <Td>{cell === location ? title : ''}</Td>
              <Th scope="row" className="symbol">
                {cell.name}
              </Th>
              <Td numeric>
                <Figures value={cell.value} decimals={digits} />
                {cell.value === null && cell.reason && (
                  <span className="block text-sm text-ink-soft">{cell.reason}</span>
                )}
              </Td>
              {working && <Td>{cell.value !== null && working(cell.figure, cell.name)}</Td>}
            </tr>
          )),
        )}
      </tbody>
    </Table>
  );
}
