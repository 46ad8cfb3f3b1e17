import { OwnScoresTable } from '@/components/laboratory/own-scores-table';
import { ownScoreRow } from '@/components/laboratory/own-score-row';
import { Section } from '@/components/laboratory/section';
import { SignalAdvice } from '@/components/laboratory/signal-advice';
import { Caution } from '@/components/ui/caution';
import { formatDate } from '@/lib/format';
import type { OwnScores } from '@/lib/services/own-scores';

export function ScoresPart({ scores }: { scores: OwnScores }) {
  const { round, published, entries } = scores;
  const rows = entries.map(ownScoreRow);
  const worst = (['action', 'warning'] as const).find((signal) => rows.some((row) => row.signal === signal));
  const { version, libraryVersion } = published.evaluation;
  return (
    <Section
      id="scores"
      title="Scores"
      lead={`Published on ${formatDate(round.publishedAt)}. Evaluation version ${version}, signed on ${formatDate(published.signedAt)}, statistics library ${libraryVersion}. Open a measurand to see where your result stands among all codes.`}
    >
      <OwnScoresTable round={round.slug} rows={rows} />
      {worst && <SignalAdvice signal={worst} />}
      <Caution kind="score" />
    </Section>
  );
}
