'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useRef } from 'react';
import { Button } from '@/components/ui/button';
import { Select } from '@/components/ui/controls';

export type MeasurandChoiceProps = {
  chosen: number;
  measurands: readonly { id: number; label: string }[];
};

/** A plain form, so that the choice stands in the address; with script the page follows the choice at once. */
export function MeasurandChoice({ chosen, measurands }: MeasurandChoiceProps) {
  const router = useRouter();
  const form = useRef<HTMLFormElement>(null);
  const show = (id: string) => router.push(`/laboratory/trend?measurand=${id}`, { scroll: false });
  useEffect(() => {
    // A choice made before the page listened.
    const asked = form.current && new FormData(form.current).get('measurand');
    if (typeof asked === 'string' && asked !== String(chosen)) {
      router.push(`/laboratory/trend?measurand=${asked}`, { scroll: false });
    }
  }, [chosen, router]);
  if (measurands.length < 2) return null;
  return (
    <form
      ref={form}
      method="get"
      autoComplete="off"
      action="/laboratory/trend"
      className="no-print flex flex-wrap items-end gap-3"
    >
      <Select
        // A new key shows the choice of the new page, not what the browser kept.
        key={chosen}
        label="Measurand"
        hint="The chart and the table below follow the choice."
        name="measurand"
        defaultValue={String(chosen)}
        onChange={(event) => show(event.target.value)}
        options={measurands.map(({ id, label }) => ({ value: String(id), label }))}
        className="max-w-full min-w-64"
      />
      <Button type="submit" className="[@media(scripting:enabled)]:hidden">
        Show
      </Button>
    </form>
  );
}
