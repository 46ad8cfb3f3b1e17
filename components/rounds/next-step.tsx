import type { ReactNode } from 'react';
import { ConfirmDialog, type ConfirmOutcome } from '@/components/ui/confirm-dialog';
import { formatCount, formatDateTime } from '@/lib/format';
import type { NextStep as Step, RoundFacts } from '@/lib/rules/round-states';

type Action = (form: FormData) => Promise<ConfirmOutcome>;

export type NextStepProps = {
  step: Step;
  facts: RoundFacts;
  now: string;
  publishAt: string;
  action: Action;
};

interface Words {
  label: string;
  title: string;
  confirm: string;
  pending: string;
}

const WORDS: Record<Step, Words> = {
  open: { label: 'Open the round', title: 'Open this round', confirm: 'Open it', pending: 'Opening' },
  close: { label: 'Close the round', title: 'Close this round', confirm: 'Close it', pending: 'Closing' },
  evaluate: {
    label: 'Evaluate',
    title: 'Evaluate this round',
    confirm: 'Evaluate it',
    pending: 'Evaluating',
  },
  publish: { label: 'Publish', title: 'Publish the scores', confirm: 'Publish them', pending: 'Publishing' },
};

export function stepLabel(step: Step): string {
  return WORDS[step].label;
}

/** The one button that moves a round on, with what follows from it. */
export function NextStep({ action, ...about }: NextStepProps) {
  const words = WORDS[about.step];
  return (
    <ConfirmDialog
      triggerLabel={words.label}
      triggerVariant="primary"
      title={words.title}
      confirmLabel={words.confirm}
      pendingLabel={words.pending}
      fields={{ round: about.facts.slug }}
      action={action}
    >
      <div className="flex flex-col gap-2">{consequences(about)}</div>
    </ConfirmDialog>
  );
}

function consequences({ step, facts, now, publishAt }: Omit<NextStepProps, 'action'>): ReactNode {
  if (step === 'open') return <OpenWords facts={facts} />;
  if (step === 'close') return <CloseWords facts={facts} now={now} />;
  if (step === 'evaluate') {
    return (
      <>
        <p>Assigned values, sigma_pt and scores are computed from the plan and the results as they stand.</p>
        <p>
          They are kept as a version that never changes. A reviewer other than you signs it before it can be
          published.
        </p>
        {facts.measurandsWithoutResult.length > 0 && (
          <p>Without a numeric result, and so without scores: {facts.measurandsWithoutResult.join(', ')}.</p>
        )}
      </>
    );
  }
  return (
    <>
      <p>
        Each laboratory sees its scores beside the other participants, who stay codes. This cannot be undone.
      </p>
      {!facts.isPast && <p>The people of the participating laboratories get a message.</p>}
      {!facts.isPast && publishAt > now && (
        <p className="font-semibold">
          Publication is planned for {formatDateTime(publishAt)}. You are early.
        </p>
      )}
      <p>Signed by {facts.signedBy}.</p>
    </>
  );
}

function OpenWords({ facts }: { facts: RoundFacts }) {
  return (
    <>
      <p>The plan is fixed from then on; only the later dates and the instructions can still change.</p>
      {facts.isPast ? (
        <p>This is a past round: no mail is sent, and its results are loaded from a file.</p>
      ) : (
        <p>
          The people of {formatCount(facts.participantCount, 'enrolled laboratory', 'enrolled laboratories')}{' '}
          get a message. More laboratories can be added while the round is open.
        </p>
      )}
    </>
  );
}

function CloseWords({ facts, now }: { facts: RoundFacts; now: string }) {
  const missing = facts.participantCount - facts.submittedCount;
  const isEarly = !facts.isPast && facts.closesAt > now;
  return (
    <>
      {isEarly && (
        <p className="font-semibold">
          Results are due {formatDateTime(facts.closesAt)}. You are closing early.
        </p>
      )}
      <p>
        {missing === 0
          ? `All ${facts.participantCount} participants have sent results.`
          : `${missing} of ${formatCount(facts.participantCount, 'participant')} ${missing === 1 ? 'has' : 'have'} not sent results.`}
      </p>
      <p>
        No results are taken afterwards, and the participants are fixed. A closed round cannot be opened
        again.
      </p>
    </>
  );
}
