import Link from 'next/link';
import { StateTag } from '@/components/ui/state-tag';
import { OWN_ROW, Table, Td, Th } from '@/components/ui/table';
import { formatDateTime } from '@/lib/format';
import { senderWords, type Sender } from './sender-words';

export interface ReceiptListEntry extends Sender {
  receiptCode: string;
  state: 'submitted' | 'superseded';
  resultCount: number;
  submittedAt: string;
}

export type ReceiptListProps = { round: string; receipts: readonly ReceiptListEntry[] };

/** Every submission of the laboratory in a round; replaced ones stay in the record. */
export function ReceiptList({ round, receipts }: ReceiptListProps) {
  return (
    <Table caption="Your submissions" fullHeight stacked>
      <thead>
        <tr>
          <Th>Receipt</Th>
          <Th>State</Th>
          <Th>Received</Th>
          <Th>Sent by</Th>
          <Th numeric>Results</Th>
        </tr>
      </thead>
      <tbody>
        {receipts.map((receipt) => (
          <tr key={receipt.receiptCode} className={receipt.state === 'submitted' ? OWN_ROW : undefined}>
            <Th scope="row" className="figures align-top">
              <Link
                href={`/laboratory/rounds/${round}/receipts/${receipt.receiptCode}`}
                className="text-link inline-flex min-h-6 items-center"
              >
                {receipt.receiptCode}
              </Link>
            </Th>
            <Td label="State">
              <StateTag of="submission" state={receipt.state} />
            </Td>
            <Td label="Received" className="figures">
              {formatDateTime(receipt.submittedAt)}
            </Td>
            <Td label="Sent by">{senderWords(receipt)}</Td>
            <Td label="Results" numeric className="figures">
              {receipt.resultCount}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
