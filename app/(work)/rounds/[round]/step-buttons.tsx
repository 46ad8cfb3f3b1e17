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

/** The next step as one button; while something blocks it, the button says so and the round line says what. */
export function StepButtons({ actor, overview }: { actor: Actor; overview: RoundOverview }) {
  const { round, facts, next, blockers, now } = overview;
  const mayStep = next !== null && can(actor, PERMISSIONS[next]);
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
        <NextStep step={next} facts={facts} now={now} action={ACTIONS[next].bind(null, null)} />
      )}
      {mayStep && blockers.length > 0 && (
        <Button variant="primary" disabled title={blockers.map((blocker) => blocker.text).join(' ')}>
          {stepLabel(next)}
        </Button>
      )}
    </>
  );
}
