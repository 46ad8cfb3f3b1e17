'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { cx } from '@/components/ui/cx';
import { CONTROL_STYLE } from '@/components/ui/field';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { formatCount } from '@/lib/format';
import { FormDialog } from './form-dialog';
import { useServerForm, type FormAction } from './use-server-form';

export type LaboratoryOption = { id: number; name: string; town: string };
export type AddLaboratoriesProps = { action: FormAction; round: string; laboratories: LaboratoryOption[] };

export function AddLaboratories(props: AddLaboratoriesProps) {
  return (
    <FormDialog label="Add laboratories" title="Add laboratories to the round" variant="primary" wide>
      {(close) => <AddLaboratoriesForm {...props} onDone={close} />}
    </FormDialog>
  );
}

/** Ticks stay when the filter hides their rows, so that a choice can be made in several searches. */
function AddLaboratoriesForm({
  action,
  round,
  laboratories,
  onDone,
}: AddLaboratoriesProps & { onDone: () => void }) {
  const form = useServerForm(action, onDone);
  const [filter, setFilter] = useState('');
  const [ticked, setTicked] = useState<ReadonlySet<number>>(new Set());
  const wanted = filter.trim().toLowerCase();
  const shown = laboratories.filter(({ name, town }) => `${name} ${town}`.toLowerCase().includes(wanted));
  const allShown = shown.length > 0 && shown.every(({ id }) => ticked.has(id));

  function tick(ids: readonly number[], on: boolean) {
    const next = new Set(ticked);
    for (const id of ids) {
      if (on) next.add(id);
      else next.delete(id);
    }
    setTicked(next);
  }

  return (
    <form {...form.formProps} className="flex flex-col gap-4">
      <input type="hidden" name="round" value={round} />
      <input type="hidden" name="laboratories" value={[...ticked].join(',')} />
      <div className="flex flex-wrap items-center gap-3">
        <input
          type="search"
          aria-label="Search laboratories"
          placeholder="Search laboratories"
          value={filter}
          onChange={(event) => setFilter(event.target.value)}
          className={cx(CONTROL_STYLE, 'max-w-72')}
        />
        <Button
          size="small"
          onClick={() =>
            tick(
              shown.map(({ id }) => id),
              !allShown,
            )
          }
        >
          {allShown ? 'Untick all shown' : 'Tick all shown'}
        </Button>
        <span aria-live="polite" className="text-sm text-ink-soft">
          {ticked.size} of {formatCount(laboratories.length, 'laboratory', 'laboratories')} ticked
        </span>
      </div>
      <LaboratoryTicks laboratories={shown} ticked={ticked} onTick={(id, on) => tick([id], on)} />
      <How />
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Adding" disabled={ticked.size === 0}>
          Add {formatCount(ticked.size, 'laboratory', 'laboratories')}
        </SubmitButton>
      </div>
    </form>
  );
}

type LaboratoryTicksProps = {
  laboratories: LaboratoryOption[];
  ticked: ReadonlySet<number>;
  onTick: (id: number, on: boolean) => void;
};

function LaboratoryTicks({ laboratories, ticked, onTick }: LaboratoryTicksProps) {
  if (laboratories.length === 0) return <p className="text-ink-soft">No laboratory has this text.</p>;
  return (
    <ul className="grid max-h-72 gap-x-6 overflow-auto border-y py-1 sm:grid-cols-2">
      {laboratories.map(({ id, name, town }) => (
        <li key={id}>
          <label className="flex min-h-9 cursor-pointer items-center gap-2.5 md:min-h-7">
            <input
              type="checkbox"
              checked={ticked.has(id)}
              onChange={(event) => onTick(id, event.target.checked)}
              className="size-5 shrink-0 accent-press"
            />
            <span>
              {name}
              {town && <span className="text-ink-soft">, {town}</span>}
            </span>
          </label>
        </li>
      ))}
    </ul>
  );
}

function How() {
  return (
    <fieldset className="flex flex-col gap-1">
      <legend className="mb-1 font-semibold">They are</legend>
      <label className="flex min-h-7 cursor-pointer items-center gap-2.5">
        <input type="radio" name="state" value="invited" defaultChecked className="size-5 accent-press" />
        invited, and accept or decline themselves
      </label>
      <label className="flex min-h-7 cursor-pointer items-center gap-2.5">
        <input type="radio" name="state" value="enrolled" className="size-5 accent-press" />
        enrolled at once
      </label>
    </fieldset>
  );
}
