'use client';

import { useMemo, useState } from 'react';
import { ConfirmDialog, type ConfirmOutcome } from '@/components/ui/confirm-dialog';
import { CopyButton } from '@/components/ui/copy-button';
import { cx } from '@/components/ui/cx';
import { CONTROL_STYLE } from '@/components/ui/field';
import { StateTag, type EnrolmentStateName } from '@/components/ui/state-tag';
import { Table, Td, Th } from '@/components/ui/table';
import { formatCount, formatDateTime } from '@/lib/format';

export interface ParticipantRow {
  laboratoryId: number;
  /** Null for readers who may not see who is behind a code. */
  laboratoryName: string | null;
  town: string | null;
  participantCode: string;
  state: EnrolmentStateName;
  reason: string;
  itemsReceivedAt: string | null;
  submittedAt: string | null;
  resultCount: number | null;
}

type Action = (form: FormData) => Promise<ConfirmOutcome>;

export type ParticipantsTableProps = {
  round: string;
  rows: ParticipantRow[];
  /** Given while participants may still be changed by the reader. */
  withdraw?: Action;
  enrol?: Action;
};

/** Who takes part, and how far each is. The filter looks at names, towns, codes and states. */
export function ParticipantsTable({ round, rows, withdraw, enrol }: ParticipantsTableProps) {
  const [filter, setFilter] = useState('');
  const showsNames = rows.some((row) => row.laboratoryName !== null);
  const shown = useMemo(
    () => rows.filter((row) => textOf(row).includes(filter.trim().toLowerCase())),
    [rows, filter],
  );
  return (
    <div>
      <div className="no-print mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <input
          type="search"
          aria-label="Filter participants"
          placeholder="Filter participants"
          value={filter}
          onChange={(event) => setFilter(event.target.value)}
          className={cx(CONTROL_STYLE, 'max-w-64')}
        />
        <span aria-live="polite" className="text-sm text-ink-soft">
          {shown.length === rows.length
            ? formatCount(rows.length, 'participant')
            : `${shown.length} of ${formatCount(rows.length, 'participant')}`}
        </span>
        <span className="ml-auto">
          <CopyButton text={() => asText(shown, showsNames)} label="Copy as text" />
        </span>
      </div>
      <Table caption="Participants" hideCaption stacked>
        <thead>
          <tr>
            <Th>Code</Th>
            {showsNames && <Th>Laboratory</Th>}
            <Th>Enrolment</Th>
            {showsNames && <Th>Items received</Th>}
            {showsNames && <Th>Results sent</Th>}
            {withdraw && (
              <Th>
                <span className="sr-only">Change</span>
              </Th>
            )}
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => (
            <tr key={row.participantCode}>
              <Th scope="row" className="figures font-semibold">
                {row.participantCode}
              </Th>
              {showsNames && (
                <Td label="Laboratory">
                  {row.laboratoryName}
                  {row.town && <span className="text-ink-soft">, {row.town}</span>}
                </Td>
              )}
              <Td label="Enrolment">
                <StateTag of="enrolment" state={row.state} />
                {row.reason && <span className="block max-w-64 text-sm text-ink-soft">{row.reason}</span>}
              </Td>
              {showsNames && <Progress row={row} />}
              {withdraw && (
                <Td className="text-right">
                  <Change round={round} row={row} withdraw={withdraw} enrol={enrol} />
                </Td>
              )}
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

function Progress({ row }: { row: ParticipantRow }) {
  return (
    <>
      <Td label="Items received" className="figures">
        {row.itemsReceivedAt ? formatDateTime(row.itemsReceivedAt) : <Nothing />}
      </Td>
      <Td label="Results sent" className="figures">
        {row.submittedAt ? (
          <>
            {formatDateTime(row.submittedAt)}
            <span className="block text-sm text-ink-soft">{formatCount(row.resultCount ?? 0, 'result')}</span>
          </>
        ) : (
          <Nothing />
        )}
      </Td>
    </>
  );
}

function Nothing() {
  return <span className="text-grey">not yet</span>;
}

/** The same word stands in each row; read out, it says whom it is about. */
function NamedLabel({ verb, who }: { verb: string; who: string }) {
  return (
    <>
      {verb}
      <span className="sr-only"> {who}</span>
    </>
  );
}

function Change({
  round,
  row,
  withdraw,
  enrol,
}: {
  round: string;
  row: ParticipantRow;
  withdraw: Action;
  enrol?: Action;
}) {
  const fields = { round, laboratory: String(row.laboratoryId) };
  const who = row.laboratoryName ?? row.participantCode;
  const isIn = row.state === 'enrolled' || row.state === 'invited';
  if (isIn) {
    return (
      <span className="inline-flex flex-wrap justify-end">
        {row.state === 'invited' && enrol && <Enrol fields={fields} who={who} enrol={enrol} />}
        <ConfirmDialog
          triggerLabel={<NamedLabel verb="Withdraw" who={who} />}
          triggerVariant="quiet"
          triggerSize="small"
          title={`Withdraw ${who}`}
          confirmLabel="Withdraw"
          danger
          fields={fields}
          reason={{ name: 'reason', label: 'Reason', hint: 'It stands in the log and in this table' }}
          action={withdraw}
        >
          The laboratory takes no further part. Results it has sent are kept but not counted.
        </ConfirmDialog>
      </span>
    );
  }
  return enrol && <Enrol fields={fields} who={who} enrol={enrol} />;
}

function Enrol({ fields, who, enrol }: { fields: Record<string, string>; who: string; enrol: Action }) {
  return (
    <ConfirmDialog
      triggerLabel={<NamedLabel verb="Enrol" who={who} />}
      triggerVariant="quiet"
      triggerSize="small"
      title={`Enrol ${who}`}
      confirmLabel="Enrol"
      fields={fields}
      action={enrol}
    >
      The laboratory takes part in the round and may send results.
    </ConfirmDialog>
  );
}

function textOf(row: ParticipantRow): string {
  if (row.laboratoryName === null) return `${row.participantCode} ${row.state}`;
  const sent = row.submittedAt ? 'sent' : 'not sent';
  return [row.participantCode, row.laboratoryName, row.town, row.state, sent].join(' ').toLowerCase();
}

function asText(rows: readonly ParticipantRow[], showsNames: boolean): string {
  const header = [
    'Code',
    ...(showsNames ? ['Laboratory'] : []),
    'Enrolment',
    ...(showsNames ? ['Items received', 'Results sent'] : []),
  ];
  const lines = rows.map((row) => [
    row.participantCode,
    ...(showsNames ? [(row.laboratoryName ?? '').replace(/^(?=[=+\-@])/, "'")] : []),
    row.state,
    ...(showsNames ? [row.itemsReceivedAt ?? '', row.submittedAt ?? ''] : []),
  ]);
  return [header, ...lines].map((cells) => cells.join('\t')).join('\n');
}
