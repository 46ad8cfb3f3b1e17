import Link from 'next/link';
import { OpenTriangle } from '@/components/ui/shapes';
import { daysBetween, formatDate, formatRelativeDays } from '@/lib/format';

export type StageState = 'done' | 'current' | 'due' | 'overdue' | 'later' | 'cancelled';
export type StageBlocker = string | { text: string; href: string };
export type RoundStage = {
  key: string;
  label: string;
  href: string | null;
  at: string | null;
  state: StageState;
  blockedBy?: readonly StageBlocker[];
};
/** State and date of a stage in words. */
export function StageWords({ stage, today }: { stage: RoundStage; today: string }) {
  const date = stage.at ? formatDate(stage.at) : '';
  switch (stage.state) {
    case 'done':
      return <>{date ? `done ${date}` : 'done'}</>;
    case 'current':
      return <strong className="text-ink">{date ? `now; ${date}` : 'now'}</strong>;
    case 'due':
      return (
        <span className="text-ink">{stage.at ? `due ${formatRelativeDays(stage.at, today)}` : 'due'}</span>
      );
    case 'overdue':
      return <strong className="text-warning">{overdueWords(stage.at, today)}</strong>;
    case 'cancelled':
      return <>cancelled</>;
    case 'later':
      return <>{date || 'later'}</>;
  }
}

function overdueWords(at: string | null, today: string): string {
  const days = at ? -daysBetween(today, at) : 0;
  if (days < 1) return 'overdue';
  return `overdue by ${days === 1 ? 'a day' : `${days} days`}`;
}

/** What holds a stage up, each with a link to where it is mended. */
export function StageBlockers({ stages }: { stages: readonly RoundStage[] }) {
  const blocked = stages.filter((stage) => stage.blockedBy && stage.blockedBy.length > 0);
  if (blocked.length === 0) return null;
  return (
    <div className="no-print mt-3 flex flex-col gap-1.5 text-sm">
      {blocked.map((stage) => (
        <div key={stage.key} className="flex flex-wrap items-baseline gap-x-2">
          <span className="inline-flex items-baseline gap-1.5 font-semibold text-warning">
            <OpenTriangle />
            {stage.label} is held up
          </span>
          <ul className="flex flex-col">
            {stage.blockedBy?.map((blocker, index) => (
              <li key={index}>
                {typeof blocker === 'string' ? (
                  blocker
                ) : (
                  <Link href={blocker.href} className="text-link inline-flex min-h-6 items-center">
                    {blocker.text}
                  </Link>
                )}
              </li>
            ))}
          </ul>
        </div>
      ))}
    </div>
  );
}
