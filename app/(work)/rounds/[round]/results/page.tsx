import Link from 'next/link';
import { MeasurandLinks } from '@/components/rounds/measurand-links';
import { resultsMatrix, resultsOfMeasurand } from '@/components/rounds/results-columns';
import { DataTable } from '@/components/ui/data-table';
import { EmptyState } from '@/components/ui/empty-state';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { getResultsByCode } from '@/lib/services/round-results';
import { loadRound } from '../load-round';

export const metadata = { title: 'Results' };

export default async function ResultsPage({ params, searchParams }: PageProps<'/rounds/[round]/results'>) {
  await requirePageActor('round:see-results');
  const { round: slug } = await params;
  const { measurand } = await searchParams;
  const { round } = await loadRound(slug);
  const { measurands, results, missingCodes } = await getResultsByCode(slug);
  const chosen = measurands.find((entry) => String(entry.id) === measurand);
  const table = chosen ? resultsOfMeasurand(chosen, results) : resultsMatrix(measurands, results);
  const page = `/rounds/${slug}/results`;
  return (
    <section className="flex flex-col gap-4" aria-labelledby="results">
      <h2 id="results">Results by code</h2>
      <Missing codes={missingCodes} isOpen={round.state === 'open'} />
      {results.length === 0 ? (
        <EmptyState title="No result yet">
          {round.state === 'draft'
            ? 'Laboratories send results once the round is open.'
            : 'Results stand here as soon as a laboratory sends them, by participant code.'}
        </EmptyState>
      ) : (
        <>
          <MeasurandLinks
            current={chosen?.id ?? 0}
            links={measurands.map((entry) => ({ ...entry, href: `${page}?measurand=${entry.id}` }))}
          />
          {chosen && (
            <p>
              <Link href={page} className="text-link">
                All measurands side by side
              </Link>
            </p>
          )}
          <DataTable
            key={chosen?.id ?? 'all'}
            caption={
              chosen
                ? `Results for ${chosen.name} in item ${chosen.itemCode}`
                : "Results in the plan's units, with what was written in another unit in brackets"
            }
            columns={table.columns}
            rows={table.rows}
            sortBy={{ key: 'code' }}
            filterLabel="Filter results"
          />
        </>
      )}
    </section>
  );
}

function Missing({ codes, isOpen }: { codes: string[]; isOpen: boolean }) {
  if (codes.length === 0) return null;
  return (
    <details className="max-w-measure border-y py-1" open={codes.length <= 20}>
      <summary className="flex min-h-9 items-center font-semibold text-press">
        {formatCount(codes.length, 'participant has', 'participants have')} sent nothing{isOpen && ' yet'}
      </summary>
      <p className="figures pb-2 whitespace-normal">{codes.join(', ')}</p>
    </details>
  );
}
