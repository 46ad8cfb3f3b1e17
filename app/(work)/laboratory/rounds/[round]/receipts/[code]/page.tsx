import { ReceiptFacts } from '@/components/laboratory/receipt-facts';
import { ReceiptRows } from '@/components/laboratory/receipt-rows';
import { PrintButton } from '@/components/rounds/print-button';
import { buttonStyle } from '@/components/ui/button-style';
import { Notice } from '@/components/ui/notice';
import { publicAddress } from '@/lib/env';
import { formatDateTime } from '@/lib/format';
import { getOwnReceipt } from '@/lib/services/receipts';
import { findOwn, requireOwnPlace } from '../../../../own-place';
import { RoundHead } from '../../round-head';

export const metadata = { title: 'Receipt' };

export default async function ReceiptPage({
  params,
  searchParams,
}: PageProps<'/laboratory/rounds/[round]/receipts/[code]'>) {
  const place = await requireOwnPlace();
  const { round: slug, code } = await params;
  const { round, head, rows } = await findOwn(place, `receipt ${code} of ${slug}`, () =>
    getOwnReceipt(slug, place.laboratoryId, code),
  );
  const isAgain = (await searchParams).again === '1';
  return (
    <>
      <RoundHead
        round={round}
        now={new Date().toISOString()}
        here="results"
        title={`Receipt ${head.receiptCode}`}
      />
      {isAgain && (
        <Notice title="This file was your current submission already.">
          Nothing was changed; this is its receipt.
        </Notice>
      )}
      {head.replacedBy && (
        <Notice title="A later file took its place.">
          Receipt {head.replacedBy} of {formatDateTime(head.replacedAt)} counts. This one stays in the record.
        </Notice>
      )}
      <ReceiptFacts head={head} round={slug} checkAddress={`${publicAddress()}/check/${head.receiptCode}`} />
      <div className="no-print flex flex-wrap gap-2">
        {head.channel !== 'whole-round' && (
          <a
            href={`/laboratory/rounds/${slug}/receipts/${head.receiptCode}/file`}
            download
            className={buttonStyle('plain')}
          >
            Download the file as sent
          </a>
        )}
        <PrintButton />
      </div>
      <ReceiptRows rows={rows} />
    </>
  );
}
