import { NextStep, stepLabel } from '@/components/rounds/next-step';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { can, type Permission } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';
import { ROUND_STEPS, type NextStep as Step } from '@/lib/rules/round-states';
import type { RoundOverview } from '@/lib/services/round-overview';
import {
  cancelRoundAction,
  closeRoundAction,
  evaluateRoundAction,
  openRoundAction,
  publishRoundAction,
} from '../actions';

const ACTIONS = {
  open: openRoundAction,
  close: closeRoundAction,
  evaluate: evaluateRoundAction,
  publish: publishRoundAction,
};

const PERMISSIONS: Record<Step, Permission> = {
  open: 'round:open',
  close: 'round:close',
  evaluate: 'round:evaluate',
  publish: 'round:publish',
};

/** The next step as one button; while something blocks it, it says so; the round line leads to what. */
export function StepButtons({ actor, overview }: { actor: Actor; overview: RoundOverview }) {
  const { round, facts, next, blockers, now } = overview;
  const mayStep = next !== null && can(actor, PERMISSIONS[next]);
  // Before the results are due, the round line does not call a missing result a hold-up.
  const isSaidHere = next === 'close' && !round.isPast && round.closesAt > now;
  const mayCancel = can(actor, 'round:cancel') && ROUND_STEPS.cancel.from.includes(round.state);
  return (
    <>
      {mayCancel && (
        <ConfirmDialog
          triggerLabel="Cancel the round"
          triggerVariant="quiet"
          title="Cancel this round"
          confirmLabel="Cancel the round"
          pendingLabel="Cancelling"
          danger
          fields={{ round: round.slug }}
          reason={{ name: 'reason', label: 'Reason', hint: 'Participants read it' }}
          action={cancelRoundAction.bind(null, null)}
        >
          Nothing is deleted, but the round ends here and cannot be taken up again.
        </ConfirmDialog>
      )}
      {mayStep && blockers.length === 0 && (
        <NextStep
          step={next}
          facts={facts}
          now={now}
          publishAt={round.publishAt}
          action={ACTIONS[next].bind(null, null)}
        />
      )}
      {mayStep && blockers.length > 0 && (
        <div>
          <Button variant="primary" disabled aria-describedby={isSaidHere ? 'step-blockers' : undefined}>
            {stepLabel(next)}
          </Button>
          {isSaidHere && (
            <p id="step-blockers" className="mt-1 max-w-64 text-sm text-ink-soft">
              {blockers.map((blocker) => blocker.text).join(' ')}
            </p>
          )}
        </div>
      )}
    </>
  );
}
