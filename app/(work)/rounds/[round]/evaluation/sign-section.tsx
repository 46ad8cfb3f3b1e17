import { SignForm } from '@/components/forms/sign-form';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Notice } from '@/components/ui/notice';
import { formatDateTime } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { listSigners, type PreparedEvaluation } from '@/lib/services/read-evaluation';
import { signatureOf, type Round } from '@/lib/services/round-overview';
import { returnAction, signAction } from './actions';

type SignSectionProps = { actor: Actor; round: Round; found: PreparedEvaluation };

/** What has been decided on this version, or the way to decide it. */
export async function SignSection({ actor, round, found }: SignSectionProps) {
  const { evaluation, signOffs } = found;
  const last = signOffs.at(-1);
  if (last?.decision === 'returned') {
    return (
      <Notice kind="warning" title={`Version ${evaluation.version} was returned by ${last.userName}.`}>
        {last.comment} ({formatDateTime(last.at)}) Evaluate again once it is mended; the next version takes
        its place.
      </Notice>
    );
  }
  const signature = signatureOf(found);
  if (signature) {
    return (
      <Notice kind="done" title={`Version ${evaluation.version} is signed.`}>
        {signature.userName}, {formatDateTime(signature.at)}.{signature.comment && ` ${signature.comment}`}
        {round.state === 'evaluated' && ' It can be published.'}
      </Notice>
    );
  }
  if (round.state !== 'evaluated') return null;
  if (can(actor, 'round:sign', { preparedBy: [evaluation.createdBy] })) {
    return <Decide slug={round.slug} version={evaluation.version} />;
  }
  const signers = await listSigners(evaluation);
  return (
    <Notice title={`Version ${evaluation.version} waits for a signature.`}>
      {signers.length > 0
        ? `A reviewer who did not prepare it signs: ${signers.join(', ')}.`
        : 'There is no reviewer who did not prepare it. An administrator can give someone the role.'}
    </Notice>
  );
}

function Decide({ slug, version }: { slug: string; version: number }) {
  return (
    <section className="flex flex-col gap-3 border-y border-rule-strong py-4" aria-labelledby="decide">
      <h2 id="decide">Sign or return version {version}</h2>
      <p className="max-w-measure">
        You did not prepare this evaluation. Your signature says that you have read it and release it for
        publication.
      </p>
      <SignForm action={signAction} round={slug} version={version} />
      <div>
        <ConfirmDialog
          triggerLabel="Return it"
          title={`Return version ${version}`}
          confirmLabel="Return it"
          pendingLabel="Returning"
          fields={{ round: slug, version: String(version) }}
          reason={{ name: 'reason', label: 'Reason', hint: 'What is to be mended before you sign' }}
          action={returnAction.bind(null, null)}
        >
          The round goes back to review. This version and your reason stay in the record.
        </ConfirmDialog>
      </div>
    </section>
  );
}
