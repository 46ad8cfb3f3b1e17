// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { renderToStaticMarkup } from 'react-dom/server';
import { afterEach, describe, expect, it } from 'vitest';
import { DataTable, type DataColumn, type DataRow } from '@/components/ui/data-table';
import { cellText, numberToSort } from '@/components/ui/data-cells';
import { toTabSeparated } from '@/components/ui/tab-separated';

const columns: DataColumn[] = [
  { key: 'code', label: 'Code', kind: 'link' },
  { key: 'raw', label: 'As reported', kind: 'number' },
  { key: 'z', label: 'z', kind: 'score' },
  { key: 'at', label: 'Submitted', kind: 'date' },
  { key: 'note', label: 'Comment', kind: 'text', sortable: false },
];
const row = (code: string, raw: string | null, score: number | null, note = ''): DataRow => ({
  id: code,
  cells: {
    code: { text: code, href: `/labs/${code}` },
    raw,
    z: { score, signal: score === null ? 'not-scored' : score > 2 ? 'warning' : 'none' },
    at: '2026-11-20T10:00:00Z',
    note,
  },
});
const rows = [
  row('L10', '12.30', 2.4),
  row('L2', '<2.0', null, '=SUM(A1)'),
  row('L3', '5', -1.25, 'two\tlines\nhere'),
];

afterEach(cleanup);

const codes = () => screen.getAllByRole('link').map((link) => link.textContent);
const table = <DataTable caption="All codes" columns={columns} rows={rows} />;

describe('DataTable', () => {
  it('is complete when the server has drawn it', () => {
    const html = renderToStaticMarkup(table);
    for (const text of ['L10', 'L2', 'L3', '12.30', '&lt;2.0', 'warning', '20 Nov 2026'])
      expect(html).toContain(text);
    expect(html).toContain('data-pad="0">&lt;2.0');
    expect(html).toContain('data-pad=".00">5');
  });

  it('sorts numbers by size and keeps what is missing last in both directions', () => {
    render(table);
    const heading = screen.getByRole('columnheader', { name: 'z' });
    fireEvent.click(within(heading).getByRole('button'));
    expect(codes()).toEqual(['L3', 'L10', 'L2']);
    expect(heading.getAttribute('aria-sort')).toBe('ascending');
    fireEvent.click(within(heading).getByRole('button'));
    expect(codes()).toEqual(['L10', 'L3', 'L2']);
    expect(heading.getAttribute('aria-sort')).toBe('descending');
  });

  it('sorts codes as people count and reported text by its figure', () => {
    render(table);
    fireEvent.click(screen.getByRole('button', { name: 'Code' }));
    expect(codes()).toEqual(['L2', 'L3', 'L10']);
    fireEvent.click(screen.getByRole('button', { name: 'As reported' }));
    expect(codes()).toEqual(['L2', 'L3', 'L10']);
  });

  it('starts in the order it is given', () => {
    render(
      <DataTable caption="All codes" columns={columns} rows={rows} sortBy={{ key: 'z', descending: true }} />,
    );
    expect(codes()).toEqual(['L10', 'L3', 'L2']);
  });

  it('filters by any text, the signal too, and says how many are left', () => {
    render(table);
    fireEvent.change(screen.getByRole('searchbox'), { target: { value: 'WARN' } });
    expect(codes()).toEqual(['L10']);
    expect(screen.getByText('1 of 3 rows')).toBeTruthy();
    fireEvent.change(screen.getByRole('searchbox'), { target: { value: 'nothing like it' } });
    expect(screen.getByText('No row has this text.')).toBeTruthy();
  });

  it('offers no sorting where a column has none', () => {
    render(table);
    expect(within(screen.getByRole('columnheader', { name: 'Comment' })).queryByRole('button')).toBeNull();
  });

  it('marks the row of the own laboratory', () => {
    const own = rows.map((item, index) => ({ ...item, own: index === 0 }));
    expect(renderToStaticMarkup(<DataTable caption="c" columns={columns} rows={own} />)).toContain(
      'bg-maize-wash',
    );
  });
});

describe('tab-separated text', () => {
  const lines = toTabSeparated(columns, rows).split('\n');

  it('has a header and one line a row, with ASCII minus signs', () => {
    expect(lines).toHaveLength(4);
    expect(lines[0]).toBe('Code\tAs reported\tz\tSubmitted\tComment');
    expect(lines[1]).toBe('L10\t12.30\t2.40 warning\t20 Nov 2026\t');
    expect(lines[3]).toBe('L3\t5\t-1.25\t20 Nov 2026\ttwo lines here');
  });

  it('neutralises text that a spreadsheet would run', () => {
    expect(lines[2]).toBe("L2\t<2.0\tnot scored\t20 Nov 2026\t'=SUM(A1)");
    const risky: DataRow = { id: 'x', cells: { note: '-1+cmd' } };
    expect(toTabSeparated([{ key: 'note', label: 'N', kind: 'text' }], [risky])).toBe("N\n'-1+cmd");
  });
});

describe('cells', () => {
  it('read the figure out of a result as reported', () => {
    expect(numberToSort('<2.0')).toBe(2);
    expect(numberToSort('\u22121.5')).toBe(-1.5);
    expect(numberToSort('none')).toBeNaN();
  });

  it('give the text of each kind', () => {
    expect(cellText({ key: 'a', label: 'a', kind: 'number', decimals: 1 }, -2.25)).toBe('-2.2');
    expect(cellText({ key: 'a', label: 'a', kind: 'signal' }, 'none')).toBe('');
    expect(cellText({ key: 'a', label: 'a', kind: 'signal' }, 'action')).toBe('action');
    expect(cellText({ key: 'a', label: 'a', kind: 'datetime' }, '2026-12-01T14:05:00Z')).toBe(
      '1 Dec 2026, 14:05 UTC',
    );
    expect(cellText({ key: 'a', label: 'a', kind: 'text' }, null)).toBe('');
  });
});
