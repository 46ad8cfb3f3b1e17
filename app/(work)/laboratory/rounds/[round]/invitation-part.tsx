import { DeclineDialog } from '@/components/laboratory/decline-dialog';
import { Section } from '@/components/laboratory/section';
import { Facts } from '@/components/ui/facts';
import type { LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { formatDateTime } from '@/lib/format';
import { ButtonForm } from '../../../button-form';
import type { OwnPlace } from '../../own-place';
import { acceptInvitationAction, declineInvitationAction } from './actions';

export interface InvitationPartProps {
  round: LaboratoryRound;
  place: OwnPlace;
  canAnswer: boolean;
  now: string;
}

export function InvitationPart({ round, place, canAnswer, now }: InvitationPartProps) {
  const isTimely = (round.state === 'draft' || round.state === 'open') && round.closesAt > now;
  const isAnswerable = isTimely && round.enrolmentState !== 'withdrawn';
  const fields = { round: round.slug, laboratory: String(place.laboratoryId) };
  return (
    <Section id="invitation" title={TITLES[round.enrolmentState]} lead={leadOf(round, isAnswerable)}>
      <Facts
        columns={2}
        items={[
          { label: 'Items leave', value: formatDateTime(round.dispatchAt) },
          { label: 'Results are due', value: formatDateTime(round.closesAt) },
          { label: 'Scores are planned for', value: formatDateTime(round.publishAt) },
          {
            label: 'Fee',
            value:
              round.feeCents === 0 ? 'none' : `${(round.feeCents / 100).toFixed(2)} ${round.feeCurrency}`,
          },
        ]}
      />
      {isAnswerable && canAnswer && (
        <div className="flex flex-wrap items-start gap-2">
          <ButtonForm
            action={acceptInvitationAction}
            fields={fields}
            label={round.enrolmentState === 'declined' ? 'Take part after all' : 'Accept'}
            pendingLabel="Saving"
            variant="primary"
            size="normal"
          />
          {round.enrolmentState === 'invited' && (
            <DeclineDialog action={declineInvitationAction} fields={fields} />
          )}
        </div>
      )}
      {isAnswerable && !canAnswer && <p>The manager of your laboratory can accept or decline.</p>}
    </Section>
  );
}

const TITLES = {
  invited: 'Your laboratory is invited',
  enrolled: 'Your laboratory takes part',
  declined: 'Your laboratory declined',
  withdrawn: 'Your laboratory was withdrawn',
};

function leadOf(round: LaboratoryRound, isAnswerable: boolean): string | undefined {
  if (round.enrolmentState === 'withdrawn') {
    return 'It no longer takes part in this round. What was sent before is kept. Ask the provider about it.';
  }
  return isAnswerable ? undefined : 'The invitation can no longer be answered.';
}
