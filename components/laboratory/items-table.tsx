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

/** The test items as their labels name them, with what is to be measured in each. */
export function ItemsTable({ items, measurands }: ItemsTableProps) {
  return (
    <Table caption="Items and what to measure in them" hideCaption fullHeight>
      <thead>
        <tr>
          <Th>Item</Th>
          <Th>What it is</Th>
          <Th>To be measured</Th>
          <Th>Handling</Th>
        </tr>
      </thead>
      <tbody>
        {items.map((item) => (
          <tr key={item.id}>
            <Th scope="row" className="align-top font-semibold">
              {item.code}
            </Th>
            <Td>
              {item.name}
              {item.matrix && <span className="block text-sm text-ink-soft">{item.matrix}</span>}
            </Td>
            <Td>
              <ul>
                {measurands
                  .filter((entry) => entry.testItemId === item.id)
                  .map((entry) => (
                    <li key={entry.id}>
                      <span className="font-semibold">{entry.code}</span> {entry.name}, {entry.unit}
                      {entry.replicates > 1 && `, ${formatCount(entry.replicates, 'replicate')}`}
                    </li>
                  ))}
              </ul>
            </Td>
            <Td className="whitespace-pre-line">{item.handling || 'As your own procedures say.'}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
