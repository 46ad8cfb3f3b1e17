import { CheckForm } from '@/components/laboratory/check-form';
import { Facts } from '@/components/ui/facts';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import type { PublicReceipt } from '@/db/views/receipt-view';
import { formatDateTime } from '@/lib/format';
import { findReceiptByCode } from '@/lib/services/receipts';

export const metadata = { title: 'Check a receipt' };

export default async function CheckedReceiptPage({ params }: PageProps<'/check/[code]'>) {
  const code = decodeURIComponent((await params).code);
  const receipt = await findReceiptByCode(code);
  return (
    <>
      <PageHeader title="Check a receipt" breadcrumb={[{ href: '/check', label: 'Another code' }]} />
      {receipt ? <Genuine receipt={receipt} /> : <Unknown code={code} />}
    </>
  );
}

function Genuine({ receipt }: { receipt: PublicReceipt }) {
  return (
    <>
      <Notice kind="done" title="This receipt is genuine.">
        Results were received under this code. The laboratory is not named here, and neither are its results.
      </Notice>
      <Facts
        items={[
          { label: 'Receipt', value: receipt.receiptCode },
          { label: 'Scheme', value: receipt.schemeName },
          { label: 'Round', value: receipt.roundName },
          { label: 'Received', value: formatDateTime(receipt.submittedAt) },
          {
            label: 'Replaced',
            value: receipt.replacedAt ? `by a later file on ${formatDateTime(receipt.replacedAt)}` : 'no',
          },
          { label: 'SHA-256 of the file', value: <code className="text-sm">{receipt.sha256}</code> },
        ]}
      />
      <p className="max-w-measure text-ink-soft">
        The SHA-256 is a fingerprint of the file. If the file you hold has the same, it is the one that was
        received, byte for byte; <code className="text-sm">sha256sum</code> on a command line computes it.
      </p>
    </>
  );
}

const SHOWN = 40;

function Unknown({ code }: { code: string }) {
  return (
    <>
      <Notice kind="problem" title="No receipt has this code.">
        Found {`\u201c${code.slice(0, SHOWN)}\u201d`}. A code has twelve signs in three groups, such as
        7QK2-0XNB-4TRM. Look for a mistyped sign.
      </Notice>
      <CheckForm code={code.slice(0, SHOWN)} />
    </>
  );
}
