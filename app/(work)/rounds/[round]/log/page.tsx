import { actionWords, whoWords } from '@/components/rounds/log-words';
import { ButtonLink } from '@/components/ui/button';
import { Table, Td, Th } from '@/components/ui/table';
import { requirePageActor } from '@/lib/auth/guards';
import { formatDateTime } from '@/lib/format';
import { getRoundLog } from '@/lib/services/round-log';
import { findOr404 } from '../../find-or-404';

export const metadata = { title: 'Log' };

export default async function LogPage({ params, searchParams }: PageProps<'/rounds/[round]/log'>) {
  const actor = await requirePageActor('round:see-log');
  const { round: slug } = await params;
  const { before } = await searchParams;
  const from = typeof before === 'string' && /^\d{1,12}$/.test(before) ? Number(before) : undefined;
  const { lines, olderThan } = await findOr404(getRoundLog(actor, slug, from));
  return (
    <section className="flex flex-col gap-3" aria-labelledby="log">
      <h2 id="log">Log of the round</h2>
      <p className="text-ink-soft">
        What was done in this round and by whom, the newest first. People of laboratories appear as
        participant codes.
      </p>
      <Table caption="Log of the round" hideCaption fullHeight stacked>
        <thead>
          <tr>
            <Th>When</Th>
            <Th>Who</Th>
            <Th>What</Th>
            <Th>Details</Th>
          </tr>
        </thead>
        <tbody>
          {lines.map((line) => (
            <tr key={line.id}>
              <Td label="When" className="figures">
                {formatDateTime(line.at)}
              </Td>
              <Td label="Who" className="min-w-40">
                {whoWords(line)}
              </Td>
              <Td label="What" className="min-w-64">
                {actionWords(line)}
                {line.outcome === 'refused' && <span className="text-warning"> (refused)</span>}
              </Td>
              <Td label={line.detail ? 'Details' : undefined} className="wrap-anywhere text-sm text-ink-soft">
                {line.detail}
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {olderThan !== null && (
        <div>
          <ButtonLink href={`/rounds/${slug}/log?before=${olderThan}`}>Older lines</ButtonLink>
        </div>
      )}
    </section>
  );
}
