import { currentPlace } from '@/components/laboratory/laboratory-stages';
import { formatDateTime } from '@/lib/format';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/laboratory/section';
import { can } from '@/lib/rules/permissions';
import { getOwnRound, type OwnRound } from '@/lib/services/laboratory-round';
import { findOwnScores } from '@/lib/services/own-scores';
import { findOwn, requireOwnPlace, type OwnPlace } from '../../own-place';
import { InvitationPart } from './invitation-part';
import { ItemsPart } from './items-part';
import { ResultsPart } from './results-part';
import { RoundHead } from './round-head';
import { ScoresPart } from './scores-part';

export const metadata = { title: 'Round' };

export default async function OwnRoundPage({ params }: PageProps<'/laboratory/rounds/[round]'>) {
  const place = await requireOwnPlace();
  const { round: slug } = await params;
  const now = new Date().toISOString();
  const own = await findOwn(place, `round ${slug}`, () => getOwnRound(slug, place.laboratoryId, now));
  const { round } = own;
  return (
    <>
      <RoundHead round={round} now={now} here={currentPlace(round)} />
      <StateNotice own={own} now={now} />
      {round.enrolmentState !== 'enrolled' && (
        <InvitationPart round={round} place={place} canAnswer={canAnswer(place)} now={now} />
      )}
      {round.state === 'published' ? (
        <AfterPublication own={own} place={place} now={now} />
      ) : (
        <Before own={own} place={place} now={now} />
      )}
      {round.instructions && (
        <Section id="instructions" title="Instructions from the provider">
          <p className="max-w-measure whitespace-pre-line">{round.instructions}</p>
        </Section>
      )}
    </>
  );
}

function canAnswer({ actor, laboratoryId }: OwnPlace): boolean {
  return can(actor, 'own:enrol', { laboratoryId });
}

function StateNotice({ own: { round }, now }: { own: OwnRound; now: string }) {
  if (round.state === 'cancelled') {
    return (
      <Notice title="This round is cancelled.">
        {round.cancelReason && `Reason given by the provider: ${round.cancelReason}`}
      </Notice>
    );
  }
  if (round.enrolmentState !== 'enrolled') return null;
  if (round.state === 'draft') {
    return (
      <Notice title="The provider is still planning this round.">
        It is to open on {formatDateTime(round.opensAt)}. The items and measurands stand here from then on.
      </Notice>
    );
  }
  if (round.state === 'closed' || round.state === 'evaluated') {
    const isLate = round.publishAt <= now;
    return (
      <Notice title="The results are under review.">
        {isLate
          ? `Scores were planned for ${formatDateTime(round.publishAt)} and are not published yet.`
          : `Scores are planned for ${formatDateTime(round.publishAt)}. You will get an e-mail.`}
      </Notice>
    );
  }
  return null;
}

interface PartsProps {
  own: OwnRound;
  place: OwnPlace;
  now: string;
}

/** Items that have not arrived come first; else the results, which are what there is to do. */
function Before({ own, place, now }: PartsProps) {
  const items = <ItemsPart own={own} laboratoryId={place.laboratoryId} now={now} />;
  const results = <ResultsPart own={own} place={place} now={now} />;
  const isWaitingForItems = own.round.itemsReceivedAt === null && own.receipts.length === 0;
  return isWaitingForItems ? (
    <>
      {items}
      {results}
    </>
  ) : (
    <>
      {results}
      {items}
    </>
  );
}

async function AfterPublication({ own, place, now }: PartsProps) {
  const scores = await findOwnScores(own.round.slug, place.laboratoryId);
  return (
    <>
      {scores && <ScoresPart scores={scores} />}
      <ResultsPart own={own} place={place} now={now} />
      <ItemsPart own={own} laboratoryId={place.laboratoryId} now={now} />
    </>
  );
}
