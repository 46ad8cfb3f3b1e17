import type { WorkingStep } from '@/lib/stats/working';
import { CopyButton } from './copy-button';
import { WorkingSteps, workingAsText } from './working-steps';

export type WorkingProps = {
  steps: readonly WorkingStep[];
  version?: string;
  label?: string;
  open?: boolean;
};

/** Shows the working in place; it needs no script and can be printed. */
export function Working({ steps, version, label = 'Show the working', open }: WorkingProps) {
  return (
    <details open={open} className="group border-y py-1">
      <summary className="flex min-h-9 items-center font-semibold text-press group-open:text-ink">
        {label}
      </summary>
      <div className="pt-1 pb-3">
        <div className="flex justify-end">
          <CopyButton text={workingAsText(steps, version)} label="Copy the working" />
        </div>
        <WorkingSteps steps={steps} version={version} />
      </div>
    </details>
  );
}
