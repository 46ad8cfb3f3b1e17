import { columnDecimals } from '@/components/ui/figures';
import { NumberCell, Table, Td, Th } from '@/components/ui/table';
import { formatDate, formatSignificant } from '@/lib/format';

export interface ReceiptResult {
  line: number;
  item: string;
  measurand: string;
  replicate: number;
  resultText: string;
  ownUnit: string;
  kind: 'value' | 'below' | 'above' | 'not-measured';
  /** In the plan's unit. */
  value: number | null;
  unit: string;
  uncertaintyText: string;
  coverageFactor: number | null;
  analysedOn: string | null;
  comment: string;
}

const DIGITS = 12;

/** The rows of a submission: what the laboratory wrote beside what it was taken as. */
export function ReceiptRows({ rows }: { rows: readonly ReceiptResult[] }) {
  const has = (of: (row: ReceiptResult) => unknown) => rows.some((row) => Boolean(of(row)));
  const withUncertainty = has((row) => row.uncertaintyText);
  const withDate = has((row) => row.analysedOn);
  const withComment = has((row) => row.comment);
  const taken = rows.map(takenAs);
  const width = columnDecimals(taken);
  return (
    <Table caption="What was received" fullHeight>
      <thead>
        <tr>
          <Th numeric>Line</Th>
          <Th>Item</Th>
          <Th>Measurand</Th>
          <Th numeric>Replicate</Th>
          <Th numeric>Result as written</Th>
          <Th numeric>Taken as</Th>
          <Th>Unit</Th>
          {withUncertainty && <Th numeric>Uncertainty as written</Th>}
          {withUncertainty && <Th numeric>k</Th>}
          {withDate && <Th>Analysed on</Th>}
          {withComment && <Th>Comment</Th>}
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <tr key={row.line}>
            <Td numeric className="figures text-ink-soft">
              {row.line}
            </Td>
            <Td>{row.item}</Td>
            <Td>{row.measurand}</Td>
            <Td numeric>{row.replicate}</Td>
            <Td numeric className="tabular-nums">
              {row.kind === 'not-measured' ? 'not measured' : `${row.resultText} ${ownUnit(row)}`}
            </Td>
            <NumberCell value={taken[index] ?? null} columnDecimals={width} />
            <Td>{row.unit}</Td>
            {withUncertainty && (
              <Td numeric className="tabular-nums">
                {row.uncertaintyText}
              </Td>
            )}
            {withUncertainty && (
              <Td numeric className="tabular-nums">
                {row.coverageFactor}
              </Td>
            )}
            {withDate && <Td className="figures">{row.analysedOn && formatDate(row.analysedOn)}</Td>}
            {withComment && <Td className="min-w-48 wrap-anywhere">{row.comment}</Td>}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function ownUnit(row: ReceiptResult): string {
  return row.ownUnit === row.unit ? '' : row.ownUnit;
}

function takenAs({ kind, value }: ReceiptResult): string | null {
  if (value === null) return null;
  const sign = kind === 'below' ? '<' : kind === 'above' ? '>' : '';
  return `${sign}${formatSignificant(value, DIGITS)}`;
}
