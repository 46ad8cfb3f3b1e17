import { CopyButton } from '@/components/ui/copy-button';
import { formatCount } from '@/lib/format';
import type { CheckReport } from './upload-outcome';

const SHOWN_AT_FIRST = 8;

/** Everything that stands against the file, in the order of the file. */
export function ProblemList({ report }: { report: CheckReport }) {
  const { problems, unlistedProblems } = report;
  const first = problems.slice(0, SHOWN_AT_FIRST);
  const rest = problems.slice(SHOWN_AT_FIRST);
  return (
    <div>
      <div className="mb-1 flex flex-wrap items-center justify-between gap-x-4">
        <h3>What to mend</h3>
        <CopyButton text={problems.map(({ message }) => message).join('\n')} label="Copy the list" />
      </div>
      <Messages entries={first} />
      {rest.length > 0 && (
        <details className="border-b">
          <summary className="flex min-h-9 items-center font-semibold text-press">
            Show {formatCount(rest.length, 'more', 'more')}
          </summary>
          <Messages entries={rest} start={SHOWN_AT_FIRST + 1} />
        </details>
      )}
      {unlistedProblems > 0 && (
        <p className="mt-2 text-ink-soft">
          {formatCount(unlistedProblems, 'further problem is', 'further problems are')} counted but not
          listed.
        </p>
      )}
    </div>
  );
}

/** What is worth a look before submitting; it does not stand in the way. */
export function NoticeList({ report }: { report: CheckReport }) {
  const { notices, unlistedNotices } = report;
  if (notices.length === 0) return null;
  return (
    <details open={notices.length <= SHOWN_AT_FIRST} className="border-y">
      <summary className="flex min-h-9 items-center font-semibold text-press">
        {formatCount(notices.length + unlistedNotices, 'thing', 'things')} worth a look
      </summary>
      <Messages entries={notices} />
    </details>
  );
}

function Messages({
  entries,
  start,
}: {
  entries: readonly { line: number | null; message: string }[];
  start?: number;
}) {
  return (
    <ol start={start} className="border-t">
      {entries.map(({ message }, index) => (
        <li key={index} className="border-b py-1.5 wrap-anywhere last:border-b-0">
          {message}
        </li>
      ))}
    </ol>
  );
}
