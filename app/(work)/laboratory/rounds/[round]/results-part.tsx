import { ReceiptList } from '@/components/laboratory/receipt-list';
import { ResultsUpload } from '@/components/laboratory/results-upload';
import { Section } from '@/components/laboratory/section';
import { buttonStyle } from '@/components/ui/button-style';
import { formatDateTime, formatRelativeDays } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import type { OwnRound } from '@/lib/services/laboratory-round';
import type { OwnPlace } from '../../own-place';

export function ResultsPart({ own, place, now }: { own: OwnRound; place: OwnPlace; now: string }) {
  const { round, receipts, whyNoResults } = own;
  const isOpen =
    whyNoResults === null && can(place.actor, 'own:submit', { laboratoryId: place.laboratoryId });
  if (!isOpen && receipts.length === 0 && round.enrolmentState !== 'enrolled') return null;
  if (round.state === 'draft') return null;
  return (
    <Section id="results" title="Results" lead={<Lead own={own} isOpen={isOpen} now={now} />}>
      {receipts.length > 0 && <ReceiptList round={round.slug} receipts={receipts} />}
      {isOpen && (
        <>
          <Templates slug={round.slug} laboratoryId={place.laboratoryId} />
          <ResultsUpload
            round={round.slug}
            laboratoryId={place.laboratoryId}
            isAmendment={receipts.length > 0}
          />
        </>
      )}
    </Section>
  );
}

interface LeadProps {
  own: OwnRound;
  isOpen: boolean;
  now: string;
}

function Lead({ own: { round, receipts, whyNoResults }, isOpen, now }: LeadProps) {
  if (isOpen) {
    const until = `${formatDateTime(round.closesAt)}, ${formatRelativeDays(round.closesAt, now)}`;
    return receipts.length > 0
      ? `Your results are in. You can send an amended file until ${until}; the earlier one stays in the record.`
      : `Results are due by ${until}.`;
  }
  const words = whyNoResults ?? 'Your role does not include sending results.';
  return receipts.length > 0 ? words : `${words} Nothing was sent by your laboratory.`;
}

/** Plain links, not Link: these are files, not pages. */
function Templates({ slug, laboratoryId }: { slug: string; laboratoryId: number }) {
  const address = `/api/rounds/${slug}/template?laboratory=${laboratoryId}`;
  return (
    <div className="no-print flex flex-wrap items-center gap-2">
      <span className="mr-2">A file to fill in:</span>
      <a href={address} download className={buttonStyle('plain', 'small')}>
        Template with commas
      </a>
      <a href={`${address}&separator=semicolon`} download className={buttonStyle('plain', 'small')}>
        Template with semicolons
      </a>
      <span className="text-sm text-ink-soft">Semicolons suit spreadsheets with a decimal comma.</span>
    </div>
  );
}
