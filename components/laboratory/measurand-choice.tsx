import { Button } from '@/components/ui/button';
import { Select } from '@/components/ui/controls';

export type MeasurandChoiceProps = {
  chosen: number;
  measurands: readonly { id: number; label: string }[];
};

/** A plain form, so that the choice stands in the address and needs no script. */
export function MeasurandChoice({ chosen, measurands }: MeasurandChoiceProps) {
  if (measurands.length < 2) return null;
  return (
    <form method="get" action="/laboratory/trend" className="no-print flex flex-wrap items-end gap-3">
      <Select
        // A new key shows the choice of the new page, not what the browser kept.
        key={chosen}
        label="Measurand"
        name="measurand"
        defaultValue={String(chosen)}
        options={measurands.map(({ id, label }) => ({ value: String(id), label }))}
        className="max-w-full min-w-64"
      />
      <Button type="submit" className="mb-1">
        Show
      </Button>
    </form>
  );
}
