import { Table, Td, Th } from '@/components/ui/table';
import { formatCount } from '@/lib/format';

export interface ItemRow {
  id: number;
  code: string;
  name: string;
  matrix: string;
  handling: string;
}

export interface ItemMeasurand {
  id: number;
  testItemId: number;
  code: string;
  name: string;
  unit: string;
  replicates: number;
}

export type ItemsTableProps = { items: readonly ItemRow[]; measurands: readonly ItemMeasurand[] };

const OWN_PROCEDURES = 'As your own procedures say.';

/** The test items as their labels name them, with what is to be measured in each. */
export function ItemsTable({ items, measurands }: ItemsTableProps) {
  const common = commonHandling(items);
  return (
    <>
      <Table caption="Items and what to measure in them" hideCaption fullHeight stacked>
        <thead>
          <tr>
            <Th>Item</Th>
            <Th>What it is</Th>
            <Th>To be measured</Th>
            {common === null && <Th>Handling</Th>}
          </tr>
        </thead>
        <tbody>
          {items.map((item) => (
            <tr key={item.id}>
              <Th scope="row" className="align-top font-semibold">
                {item.code}
              </Th>
              <Td className="min-w-40">
                {item.name}
                {item.matrix && <span className="block text-sm text-ink-soft">{item.matrix}</span>}
              </Td>
              <Td className="min-w-56">
                <ToMeasure measurands={measurands.filter((entry) => entry.testItemId === item.id)} />
              </Td>
              {common === null && <Td className="whitespace-pre-line">{item.handling || OWN_PROCEDURES}</Td>}
            </tr>
          ))}
        </tbody>
      </Table>
      {common !== null && (
        <p className="max-w-measure whitespace-pre-line">
          <strong>Handling of {items.length === 1 ? 'the item' : 'every item'}.</strong> {common}
        </p>
      )}
    </>
  );
}

function ToMeasure({ measurands }: { measurands: readonly ItemMeasurand[] }) {
  return (
    <ul>
      {measurands.map((entry) => (
        <li key={entry.id}>
          <span className="font-semibold">{entry.code}</span> {entry.name}, {entry.unit}
          {entry.replicates > 1 && `, ${formatCount(entry.replicates, 'replicate')}`}
        </li>
      ))}
    </ul>
  );
}

/** What is the same for every item is said once; null when items differ. */
function commonHandling(items: readonly ItemRow[]): string | null {
  const texts = new Set(items.map((item) => item.handling.trim() || OWN_PROCEDURES));
  return texts.size === 1 ? [...texts].join() : null;
}
