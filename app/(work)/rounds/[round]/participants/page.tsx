import { AddLaboratories } from '@/components/forms/add-laboratories';
import { ParticipantsTable } from '@/components/rounds/participants-table';
import { ProgressWatch } from '@/components/rounds/progress-watch';
import { WholeRoundUpload } from '@/components/rounds/whole-round-upload';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount } from '@/lib/format';
import { can } from '@/lib/rules/permissions';
import { listLaboratoriesToAdd, listParticipantsFor } from '@/lib/services/participant-key';
import { getRoundProgress } from '@/lib/services/round-progress';
import { loadRound } from '../load-round';
import { addLaboratoriesAction, enrolAction, withdrawAction } from './actions';

export const metadata = { title: 'Participants' };

export default async function ParticipantsPage({ params }: PageProps<'/rounds/[round]/participants'>) {
  const actor = await requirePageActor('round:view');
  const { round: slug } = await params;
  const { round } = await loadRound(slug);
  const participants = await listParticipantsFor(actor, slug);
  const progress = await getRoundProgress(slug);
  const isTaking = round.state === 'draft' || round.state === 'open';
  const mayEnrol = isTaking && can(actor, 'enrolment:edit');
  const add = mayEnrol && (
    <AddLaboratories
      action={addLaboratoriesAction}
      round={slug}
      laboratories={await listLaboratoriesToAdd(slug)}
    />
  );
  return (
    <>
      <section className="flex flex-col gap-3" aria-labelledby="participants">
        <div className="flex flex-wrap items-end justify-between gap-3">
          <div>
            <h2 id="participants">Participants</h2>
            {participants.length > 0 && (
              <p className="text-ink-soft">
                {progress.submitted} of{' '}
                {formatCount(progress.enrolled, 'enrolled laboratory', 'enrolled laboratories')}{' '}
                {progress.submitted === 1 ? 'has' : 'have'} sent results.
              </p>
            )}
            {round.state === 'open' && (
              <ProgressWatch address={`/api/rounds/${slug}/progress`} shown={progress} />
            )}
          </div>
          {participants.length > 0 && add}
        </div>
        {!can(actor, 'round:see-key') && (
          <Notice>You see codes. Who is behind a code is shown to coordinators and reviewers.</Notice>
        )}
        {participants.length === 0 ? (
          <EmptyState title="No participant yet" action={add}>
            Laboratories stand here with their code, receipt of the items and when they sent results. Each
            gets a random code that is new for this round.
          </EmptyState>
        ) : (
          <ParticipantsTable
            round={slug}
            rows={participants}
            withdraw={mayEnrol ? withdrawAction.bind(null, null) : undefined}
            enrol={mayEnrol ? enrolAction.bind(null, null) : undefined}
          />
        )}
        {can(actor, 'round:see-key') && (
          <p className="text-sm text-ink-soft">
            This page shows who is behind each code; each look is in the log.
          </p>
        )}
      </section>
      {round.state === 'open' && can(actor, 'round:load-results') && <WholeRound slug={slug} />}
    </>
  );
}

function WholeRound({ slug }: { slug: string }) {
  return (
    <section className="flex flex-col gap-3" aria-labelledby="whole-round">
      <h2 id="whole-round">Load a whole round</h2>
      <p className="max-w-measure text-ink-soft">
        For a past round, or when all results come in one file. Laboratories named in it are enrolled, and new
        ones are made. All of the file is taken or nothing.{' '}
        <a href={`/api/rounds/${slug}/template?whole=1`} className="text-link">
          Download a template
        </a>{' '}
        or one{' '}
        <a href={`/api/rounds/${slug}/template?whole=1&separator=semicolon`} className="text-link">
          with semicolons
        </a>{' '}
        for spreadsheets with a decimal comma.
      </p>
      <WholeRoundUpload round={slug} />
    </section>
  );
}
