// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { renderToStaticMarkup } from 'react-dom/server';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ChartReadout } from '@/components/charts/chart-readout';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { CopyButton } from '@/components/ui/copy-button';
import { Dialog } from '@/components/ui/dialog';
import { HeaderMenu } from '@/components/ui/header-menu';
import { Menu } from '@/components/ui/menu';
import { ThemeSwitch } from '@/components/ui/theme-switch';
import { Working } from '@/components/ui/working';
import { WorkingDialog } from '@/components/ui/working-dialog';
import { workingAsText } from '@/components/ui/working-steps';
import type { WorkingStep } from '@/lib/stats/working';

const steps: WorkingStep[] = [
  {
    name: 'Score z',
    formula: '(x - x_pt) / sigma_pt',
    clause: 'ISO 13528, 9.4',
    inputs: { x: 8.1, x_pt: 12.4, sigma_pt: 1.86, all: [1, 2] },
    value: -2.3118,
    iterations: [
      { iteration: 1, s_star: 1.25 },
      { iteration: 2, s_star: 1.2 },
    ],
  },
];

afterEach(() => {
  cleanup();
  document.documentElement.removeAttribute('data-theme');
});

describe('the working', () => {
  it('shows formula, clause, inputs, iterations, value and version without script', () => {
    const html = renderToStaticMarkup(<Working steps={steps} version="1.2.0" />);
    for (const text of [
      '(x - x_pt) / sigma_pt',
      'ISO 13528, 9.4',
      '12.4',
      '1, 2',
      's_star',
      '\u22122.3118',
      '1.2.0',
    ]) {
      expect(html).toContain(text);
    }
    expect(html).toContain('<details');
  });

  it('copies as plain text with ASCII signs', () => {
    const text = workingAsText(steps, '1.2.0');
    expect(text).toContain('Score z (ISO 13528, 9.4)');
    expect(text).toContain('  x = 8.1');
    expect(text).toContain('  iteration\ts_star\n  1\t1.25\n  2\t1.2');
    expect(text).toContain('  result: -2.3118');
    expect(text).toContain('Statistics library version 1.2.0');
  });

  it('is fetched when it is asked for, once', async () => {
    const load = vi.fn(() => Promise.resolve(steps));
    render(<WorkingDialog title="Working of z" load={load} />);
    fireEvent.click(screen.getByRole('button', { name: 'Show the working' }));
    await screen.findByText('(x - x_pt) / sigma_pt');
    fireEvent.click(screen.getByRole('button', { name: 'Close' }));
    fireEvent.click(screen.getByRole('button', { name: 'Show the working' }));
    expect(load).toHaveBeenCalledTimes(1);
  });

  it('says so when it could not be fetched', async () => {
    render(<WorkingDialog title="Working of z" load={() => Promise.reject(new Error('offline'))} />);
    fireEvent.click(screen.getByRole('button', { name: 'Show the working' }));
    await screen.findByText(/could not be fetched/);
  });
});

describe('dialogs', () => {
  it('open by their trigger and are named by their title', () => {
    render(
      <Dialog triggerLabel="Open" title="Who is behind a code" description="This look is logged.">
        Ferrow Mill
      </Dialog>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Open' }));
    expect(screen.getByRole('dialog', { name: 'Who is behind a code' }).textContent).toContain('Ferrow Mill');
  });

  it('show what was refused and keep the reason that was typed', async () => {
    const action = vi.fn(async () => ({ ok: false, formError: 'A reviewer has to agree first.' }));
    render(
      <ConfirmDialog
        triggerLabel="Cancel"
        title="Cancel this round"
        confirmLabel="Cancel the round"
        fields={{ round: 'r1' }}
        reason={{ name: 'reason', label: 'Reason' }}
        action={action}
      />,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Cancel' }));
    fireEvent.change(screen.getByLabelText('Reason'), { target: { value: 'flood' } });
    fireEvent.click(screen.getByRole('button', { name: 'Cancel the round' }));
    await screen.findByText('A reviewer has to agree first.');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Reason').value).toBe('flood');
    const form = (action.mock.calls as unknown as [FormData][])[0]?.[0];
    expect([form?.get('round'), form?.get('reason')]).toEqual(['r1', 'flood']);
  });

  it('close when the step was done', async () => {
    render(
      <ConfirmDialog
        triggerLabel="Close"
        title="Close the round"
        confirmLabel="Close it now"
        action={() => ({ ok: true })}
      />,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Close' }));
    fireEvent.click(screen.getByRole('button', { name: 'Close it now' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  });
});

describe('small leaves', () => {
  it('a menu opens by the keyboard and lists its items', async () => {
    const onSelect = vi.fn();
    render(
      <Menu
        label="Account"
        items={[
          { kind: 'heading', label: 'Acting for' },
          { label: 'Ferrow Mill', href: '/a', current: true },
          { kind: 'rule' },
          { kind: 'button', label: 'Sign out', onSelect },
        ]}
      />,
    );
    fireEvent.keyDown(screen.getByRole('button', { name: 'Account' }), { key: 'ArrowDown' });
    expect(await screen.findAllByRole('menuitem')).toHaveLength(2);
    fireEvent.click(screen.getByRole('menuitem', { name: 'Sign out' }));
    expect(onSelect).toHaveBeenCalledTimes(1);
  });

  it('two theme switches follow one choice, which is kept in a cookie', () => {
    document.documentElement.dataset.theme = 'system';
    render(
      <>
        <ThemeSwitch initial="system" />
        <ThemeSwitch initial="system" />
      </>,
    );
    fireEvent.click(screen.getAllByRole('radio', { name: 'Dark' })[1] as HTMLElement);
    expect(
      screen.getAllByRole<HTMLInputElement>('radio', { name: 'Dark' }).map((radio) => radio.checked),
    ).toEqual([true, true]);
    expect(document.documentElement.dataset.theme).toBe('dark');
    expect(document.cookie).toContain('assize_theme=dark');
  });

  it('the copy button says that it has copied, or that it could not', async () => {
    const writeText = vi.fn(() => Promise.resolve());
    Object.defineProperty(navigator, 'clipboard', { value: { writeText }, configurable: true });
    render(<CopyButton text={() => 'token'} />);
    fireEvent.click(screen.getByRole('button'));
    await screen.findByText('Copied');
    expect(writeText).toHaveBeenCalledWith('token');
    cleanup();
    Object.defineProperty(navigator, 'clipboard', { value: undefined, configurable: true });
    document.execCommand = () => false;
    render(<CopyButton text="token" />);
    fireEvent.click(screen.getByRole('button'));
    await screen.findByText(/select the text by hand/);
  });

  it('the small-screen menu closes by Escape and by following a link', () => {
    render(
      <HeaderMenu>
        <a href="#rounds">Rounds</a>
      </HeaderMenu>,
    );
    const details = screen.getByText('Menu').closest('details') as HTMLDetailsElement;
    details.open = true;
    fireEvent.keyDown(screen.getByText('Menu'), { key: 'Escape' });
    expect(details.open).toBe(false);
    details.open = true;
    fireEvent.click(screen.getByText('Rounds'));
    expect(details.open).toBe(false);
  });

  it('the chart readout shows the focused mark and moves by arrow keys', () => {
    render(
      <ChartReadout>
        <svg>
          <g className="chart-mark" data-detail="A1: z = 0.50" aria-label="A1" tabIndex={0} role="img" />
          <g className="chart-mark" data-detail="B2: z = 2.40" aria-label="B2" tabIndex={-1} role="img" />
        </svg>
      </ChartReadout>,
    );
    const first = screen.getByLabelText('A1');
    act(() => first.focus());
    expect(screen.getByText('A1: z = 0.50')).toBeTruthy();
    fireEvent.keyDown(first, { key: 'ArrowRight' });
    expect(document.activeElement).toBe(screen.getByLabelText('B2'));
    expect(screen.getByText('B2: z = 2.40')).toBeTruthy();
    expect(first.getAttribute('tabindex')).toBe('-1');
    fireEvent.keyDown(screen.getByLabelText('B2'), { key: 'Escape' });
    expect(screen.queryByText('B2: z = 2.40')).toBeNull();
  });
});
