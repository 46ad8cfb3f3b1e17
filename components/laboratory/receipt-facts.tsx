import Link from 'next/link';
import { CopyButton } from '@/components/ui/copy-button';
import { Facts, type Fact } from '@/components/ui/facts';
import { formatBytes, formatDateTime } from '@/lib/format';
import { senderWords, type Sender } from './sender-words';

export interface ReceiptFactsHead extends Sender {
  receiptCode: string;
  sha256: string;
  byteCount: number;
  fileName: string;
  resultCount: number;
  submittedAt: string;
  laboratoryName: string;
  participantCode: string;
  replaces: string | null;
}

export type ReceiptFactsProps = {
  head: ReceiptFactsHead;
  round: string;
  /** Where anyone with the code can see that the receipt is genuine. */
  checkAddress: string;
};

/** What was received, from whom, when, and how to prove it. */
export function ReceiptFacts({ head, round, checkAddress }: ReceiptFactsProps) {
  // The name and the size of a file with the whole round are the provider's, not the laboratory's.
  const file: Fact[] =
    head.channel === 'whole-round'
      ? []
      : [
          { label: 'File', value: head.fileName },
          { label: 'Size', value: formatBytes(head.byteCount) },
        ];
  const items: Fact[] = [
    { label: 'Laboratory', value: head.laboratoryName },
    { label: 'Code in the round', value: head.participantCode },
    { label: 'Received', value: formatDateTime(head.submittedAt) },
    { label: 'Sent by', value: senderWords(head) },
    ...file,
    { label: 'Results', value: head.resultCount },
    {
      label: 'Replaces receipt',
      value: head.replaces ? (
        <Link href={`/laboratory/rounds/${round}/receipts/${head.replaces}`} className="text-link">
          {head.replaces}
        </Link>
      ) : (
        'none'
      ),
    },
  ];
  return (
    <div>
      <Facts items={items} columns={2} />
      <dl className="border-b">
        <div className="flex flex-wrap items-center gap-x-4 border-b py-1.5">
          <dt className="text-ink-soft">SHA-256 of the file</dt>
          <dd className="ml-auto flex flex-wrap items-center gap-x-3">
            <code className="font-mono text-sm wrap-anywhere">{head.sha256}</code>
            <CopyButton text={head.sha256} label="Copy the SHA-256" />
          </dd>
        </div>
        <div className="flex flex-wrap items-center gap-x-4 py-1.5">
          <dt className="text-ink-soft">Anyone with the code can check it at</dt>
          <dd className="ml-auto wrap-anywhere">
            <Link href={`/check/${head.receiptCode}`} className="text-link inline-flex min-h-6 items-center">
              {checkAddress}
            </Link>
          </dd>
        </div>
      </dl>
    </div>
  );
}
