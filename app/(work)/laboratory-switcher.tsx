import { cx } from '@/components/ui/cx';
import { switchLaboratoryAction } from './account/actions';

interface LaboratorySwitcherProps {
  laboratories: { id: number; name: string }[];
  chosenId: number | null;
}

export function LaboratorySwitcher({ laboratories, chosenId }: LaboratorySwitcherProps) {
  return (
    <form action={switchLaboratoryAction} className="border-t pt-3">
      <p className="text-sm text-ink-soft">You work for</p>
      <ul>
        {laboratories.map(({ id, name }) => (
          <li key={id}>
            <button
              type="submit"
              name="laboratoryId"
              value={id}
              aria-current={id === chosenId ? 'true' : undefined}
              className={cx(
                'min-h-9 w-full cursor-pointer border-l-3 px-2 text-left hover:bg-paper-wash',
                id === chosenId ? 'border-l-maize font-semibold text-ink' : 'border-l-transparent text-press',
              )}
            >
              {name}
            </button>
          </li>
        ))}
      </ul>
    </form>
  );
}
