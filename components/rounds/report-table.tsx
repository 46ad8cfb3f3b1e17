import { Figures } from '@/components/ui/figures';
import { Signal } from '@/components/ui/signal';
import { Table, Td, Th } from '@/components/ui/table';
import type { MeasurandEvaluation } from '@/lib/stats/evaluation/types';
import { resultText, SCORE_NAMES, statisticDecimals } from './score-columns';

export type ReportTableProps = {
  caption: string;
  evaluation: MeasurandEvaluation;
  plan: { unit: string; decimals: number };
};

/** The scores by code as they stand on paper. */
export function ReportTable({ caption, evaluation, plan }: ReportTableProps) {
  const { scoreKind, scores, censored } = evaluation;
  const ordered = [...scores].sort((a, b) =>
    a.participant.localeCompare(b.participant, 'en', { numeric: true }),
  );
  const width = plan.decimals + 2;
  return (
    <Table caption={caption} fullHeight>
      <thead>
        <tr>
          <Th>Code</Th>
          <Th numeric>Result ({plan.unit})</Th>
          <Th numeric>D ({plan.unit})</Th>
          <Th numeric>D%</Th>
          <Th numeric className="pr-24.5!">
            {SCORE_NAMES[scoreKind]}
          </Th>
        </tr>
      </thead>
      <tbody>
        {ordered.map((entry) => (
          <tr key={entry.participant}>
            <Th scope="row" className="figures">
              {entry.participant}
            </Th>
            <Td numeric>
              <Figures value={resultText(entry.value, plan.decimals)} columnDecimals={width} />
            </Td>
            <Td numeric>
              <Figures value={entry.D} decimals={statisticDecimals(plan.decimals)} />
            </Td>
            <Td numeric>
              <Figures value={entry.dPercent} decimals={1} />
            </Td>
            <Td numeric>
              <Signal score={entry.score} signal={entry.signal ?? 'not-scored'} kind={scoreKind} column />
            </Td>
          </tr>
        ))}
        {censored.map((entry) => (
          <tr key={entry.participant}>
            <Th scope="row" className="figures">
              {entry.participant}
            </Th>
            <Td numeric>
              <Figures
                value={`${entry.comparator}${resultText(entry.limit, plan.decimals)}`}
                columnDecimals={width}
              />
            </Td>
            <Td colSpan={2} />
            <Td numeric>
              <Signal score={null} signal="not-scored" column />
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
