import Link from 'next/link';
import { installationWords } from '@/components/rounds/log-words';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { FilledSquare } from '@/components/ui/shapes';
import { Table, Td, Th } from '@/components/ui/table';
import { db } from '@/db/connection';
import { listLog, type LogLine } from '@/db/views/log-view';
import { requirePageActor } from '@/lib/auth/guards';
import { formatCount, formatDateTime } from '@/lib/format';
import { listQueryOf, Pager, SearchForm } from '../../list-tools';

export const metadata = { title: 'Log' };

export default async function LogPage({ searchParams }: PageProps<'/admin/log'>) {
  await requirePageActor('log:view');
  const query = listQueryOf(await searchParams);
  const log = await listLog(db(), query);
  return (
    <>
      <PageHeader
        title="Log"
        lead="What was done and what was refused, the newest first. Lines are written once and never changed."
      />
      <SearchForm path="/admin/log" text={query.text} label="Text in any column" />
      {log.total === 0 ? (
        <EmptyState title="No lines">
          {query.text
            ? `No line contains “${query.text}”.`
            : 'Each sign-in and each change leaves a line here.'}
        </EmptyState>
      ) : (
        <LogTable lines={log.rows} caption={formatCount(log.total, 'line')} />
      )}
      <Pager path="/admin/log" text={query.text} page={log.page} pageCount={log.pageCount} />
    </>
  );
}

function LogTable({ lines, caption }: { lines: LogLine[]; caption: string }) {
  return (
    <Table caption={caption} stacked>
      <thead>
        <tr>
          <Th>When</Th>
          <Th>Who</Th>
          <Th>What</Th>
          <Th>Where</Th>
          <Th>Detail</Th>
        </tr>
      </thead>
      <tbody>
        {lines.map((line) => (
          <tr key={line.id}>
            <Td label="When" className="figures">
              {formatDateTime(line.at)}
            </Td>
            <Td label="Who" className="min-w-36">
              {whoOf(line)}
            </Td>
            <Td label="What" className="min-w-56">
              {installationWords(line.action)}
              <span className="block font-mono text-xs text-ink-faint">{line.action}</span>
              {line.outcome === 'refused' && (
                <span className="flex items-baseline gap-1.5 font-semibold text-action">
                  <FilledSquare />
                  refused
                </span>
              )}
            </Td>
            <Td label={line.laboratoryName || line.roundSlug ? 'Where' : undefined} className="min-w-32">
              <Where line={line} />
            </Td>
            <Td
              label={line.detail ? 'Detail' : undefined}
              className="min-w-40 wrap-anywhere text-sm text-ink-soft"
            >
              {line.detail}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function whoOf(line: LogLine): string {
  if (line.userName) return line.userName;
  return line.tokenName ? `token ${line.tokenName}` : '–';
}

function Where({ line }: { line: LogLine }) {
  return (
    <>
      {line.laboratoryName && <span className="block">{line.laboratoryName}</span>}
      {line.roundSlug && (
        <Link href={`/rounds/${line.roundSlug}`} className="text-link block">
          {line.roundName}
        </Link>
      )}
    </>
  );
}
