import Link from 'next/link';
import type { ReactNode } from 'react';
import { layOutRoundLine, type RoundLineLayout } from '@/components/charts/round-line-geometry';
import { StageMark } from '@/components/charts/round-line-marks';
import { StageBlockers, StageWords, type RoundStage } from '@/components/charts/round-line-words';
import { cx } from '@/components/ui/cx';
import { formatDate } from '@/lib/format';

export type { RoundStage, StageBlocker, StageState } from '@/components/charts/round-line-words';
export type RoundLineProps = { stages: readonly RoundStage[]; today: string; currentPlace: string };

/** The stages of a round on one line in time. It is the way around a round and stands on each of its pages. */
export function RoundLine({ stages, today, currentPlace }: RoundLineProps) {
  const layout = layOutRoundLine(
    stages.map((stage) => stage.at),
    today,
  );
  return (
    <nav aria-label="Stages of the round" className="border-y py-3">
      <WideLine stages={stages} today={today} currentPlace={currentPlace} layout={layout} />
      <NarrowLine stages={stages} today={today} currentPlace={currentPlace} />
      <StageBlockers stages={stages} />
    </nav>
  );
}

function WideLine({ stages, today, currentPlace, layout }: RoundLineProps & { layout: RoundLineLayout }) {
  const columns = layout.weights.map((weight) => `minmax(5.5rem, ${weight.toFixed(3)}fr)`).join(' ');
  return (
    <ol className="hidden pt-5 md:grid print:grid" style={{ gridTemplateColumns: columns }}>
      {stages.map((stage, index) => (
        <li key={stage.key} className="relative min-w-0">
          <Stretch index={index} last={index === stages.length - 1} layout={layout} today={today} />
          <StageLink
            stage={stage}
            here={stage.key === currentPlace}
            className="group/stage relative block pr-2"
          >
            <StageMark state={stage.state} className="block bg-paper" />
            <StageText stage={stage} today={today} here={stage.key === currentPlace} />
          </StageLink>
        </li>
      ))}
    </ol>
  );
}

/** The line from one stage to the next: heavy as far as today, a hairline after it. */
function Stretch({
  index,
  last,
  layout,
  today,
}: {
  index: number;
  last: boolean;
  layout: RoundLineLayout;
  today: string;
}) {
  const at = layout.today;
  const passed = !at || index > at.stage ? 0 : index < at.stage ? 1 : at.fraction;
  const isHere = at?.stage === index;
  return (
    <span aria-hidden={!isHere} className="absolute inset-x-0 top-2">
      {!last && <span className="absolute inset-x-0 h-px bg-rule-strong" />}
      {!last && (
        <span className="absolute left-0 -top-px h-0.75 bg-ink" style={{ width: `${passed * 100}%` }} />
      )}
      {isHere && (
        <span
          className="absolute -top-6 h-9 border-l border-ink"
          style={{ left: `${Math.min(at.fraction, 0.98) * 100}%` }}
        >
          <span
            className={cx(
              'absolute -top-0.5 bg-paper text-xs leading-4 whitespace-nowrap',
              at.fraction > 0.6 && last ? 'right-1' : 'left-1',
            )}
          >
            today, {formatDate(today)}
          </span>
        </span>
      )}
    </span>
  );
}

function NarrowLine({ stages, today, currentPlace }: RoundLineProps) {
  const here = stages.find((stage) => stage.key === currentPlace);
  return (
    // A new key for each place closes the list once a stage has been chosen.
    <details key={currentPlace} className="group/list md:hidden print:hidden">
      <summary className="flex min-h-11 list-none items-center gap-3 [&::-webkit-details-marker]:hidden">
        <span aria-hidden="true" className="relative flex gap-2.5">
          <span className="absolute inset-x-0 top-1/2 h-px bg-rule-strong" />
          {stages.map((stage) => (
            <span key={stage.key} className="relative">
              <StageMark state={stage.state} className="bg-paper" />
              {stage.key === currentPlace && (
                <span className="absolute inset-x-0 -bottom-1.5 h-0.75 bg-maize" />
              )}
            </span>
          ))}
        </span>
        <span className="font-semibold">{here?.label ?? 'Stages'}</span>
        <svg
          viewBox="0 0 12 8"
          aria-hidden="true"
          className="ml-auto w-3 stroke-press group-open/list:rotate-180"
        >
          <path d="m1 1 5 5 5-5" fill="none" strokeWidth="1.8" />
        </svg>
        <span className="sr-only">, show all stages of the round</span>
      </summary>
      <ol className="mt-2 border-t">
        {stages.map((stage) => (
          <li key={stage.key} className="border-b">
            <StageLink
              stage={stage}
              here={stage.key === currentPlace}
              className="flex min-h-11 items-center gap-3 py-1"
            >
              <StageMark state={stage.state} />
              <StageText stage={stage} today={today} here={stage.key === currentPlace} inRow />
            </StageLink>
          </li>
        ))}
      </ol>
    </details>
  );
}

type StageLinkProps = { stage: RoundStage; here: boolean; className: string; children: ReactNode };

function StageLink({ stage, here, className, children }: StageLinkProps) {
  if (!stage.href) {
    return (
      <span aria-current={here ? 'page' : undefined} className={className}>
        {children}
      </span>
    );
  }
  return (
    <Link href={stage.href} aria-current={here ? 'page' : undefined} className={className}>
      {children}
    </Link>
  );
}

function StageText({
  stage,
  today,
  here,
  inRow,
}: {
  stage: RoundStage;
  today: string;
  here: boolean;
  inRow?: boolean;
}) {
  return (
    <span
      className={cx(
        inRow ? 'flex flex-1 items-baseline justify-between gap-x-3' : 'mt-1.5 block leading-tight',
      )}
    >
      <span
        className={cx(
          'inline-block border-b-3',
          here ? 'border-maize font-semibold text-ink' : 'border-transparent',
          !here && (stage.href ? 'text-press group-hover/stage:border-rule' : 'text-ink-faint'),
          stage.state === 'cancelled' && 'line-through',
        )}
      >
        {stage.label}
      </span>
      <span className={cx('text-sm text-ink-soft', inRow ? 'text-right' : 'block')}>
        <StageWords stage={stage} today={today} />
      </span>
    </span>
  );
}
