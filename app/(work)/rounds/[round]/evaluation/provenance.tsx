import { Facts } from '@/components/ui/facts';
import { formatDateTime } from '@/lib/format';
import type { PreparedEvaluation } from '@/lib/services/read-evaluation';

/** Which version this is, from what it was computed, by whom and what was decided on it. */
export function Provenance({ found }: { found: PreparedEvaluation }) {
  const { evaluation, signOffs, preparedByName } = found;
  return (
    <section className="flex flex-col gap-3" aria-labelledby="provenance">
      <h2 id="provenance">This version</h2>
      <Facts
        items={[
          { label: 'Version', value: evaluation.version },
          {
            label: 'Prepared',
            value: `${preparedByName ?? 'a program'}, ${formatDateTime(evaluation.createdAt)}`,
          },
          ...signOffs.map((entry) => ({
            label: entry.decision === 'signed' ? 'Signed' : 'Returned',
            value: `${entry.userName}, ${formatDateTime(entry.at)}`,
            hint: entry.comment || undefined,
          })),
          {
            label: 'SHA-256 of the inputs',
            value: <code className="text-sm">{evaluation.inputsSha256}</code>,
          },
          { label: 'Statistics library version', value: evaluation.libraryVersion },
        ]}
      />
    </section>
  );
}
