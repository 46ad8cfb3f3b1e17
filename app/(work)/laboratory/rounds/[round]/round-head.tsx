import { laboratoryStages, type LaboratoryPlace } from '@/components/laboratory/laboratory-stages';
import { RoundLine } from '@/components/rounds/round-line';
import { PageHeader, type Crumb } from '@/components/ui/page-header';
import { StateTag } from '@/components/ui/state-tag';
import type { LaboratoryRound } from '@/db/views/laboratory-rounds-view';

export interface RoundHeadProps {
  round: LaboratoryRound;
  now: string;
  here: LaboratoryPlace;
  /** The page below the round; without it, the round's own page. */
  title?: string;
}

/** Name, state and stages: the head of every page of a round. */
export function RoundHead({ round, now, here, title }: RoundHeadProps) {
  const breadcrumb: Crumb[] = [{ href: '/laboratory', label: 'Today' }];
  if (title) breadcrumb.push({ href: `/laboratory/rounds/${round.slug}`, label: round.name });
  return (
    <>
      <PageHeader
        breadcrumb={breadcrumb}
        title={title ?? round.name}
        tag={<StateTag of="round" state={round.state} />}
        lead={
          <>
            {title ? round.name : round.schemeName}
            {round.enrolmentState === 'enrolled' && (
              <>
                . Your code in this round is{' '}
                <strong className="figures text-ink">{round.participantCode}</strong>.
              </>
            )}
          </>
        }
      />
      <RoundLine stages={laboratoryStages(round, now)} today={now} currentPlace={here} />
    </>
  );
}
