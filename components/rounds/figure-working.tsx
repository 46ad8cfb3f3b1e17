'use client';

import { WorkingDialog } from '@/components/ui/working-dialog';
import type { ActionResult } from '@/lib/action-form';
import type { WorkingStep } from '@/lib/stats/working';

export type FigureWorkingProps = {
  title: string;
  label?: string;
  version: string;
  load: () => Promise<ActionResult<WorkingStep[]>>;
};

/** Opens the working of one figure, fetched when it is asked for. */
export function FigureWorking({ title, label = 'working', version, load }: FigureWorkingProps) {
  async function fetchSteps() {
    const result = await load();
    if (!result.ok) throw new Error(result.formError ?? 'the working was refused');
    return result.data;
  }
  return (
    <WorkingDialog
      title={title}
      label={
        <>
          {label}
          <span className="sr-only"> of {title}</span>
        </>
      }
      version={version}
      load={fetchSteps}
    />
  );
}
