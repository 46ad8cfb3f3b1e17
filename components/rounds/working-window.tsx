'use client';

import { useRouter } from 'next/navigation';
import { CopyButton } from '@/components/ui/copy-button';
import { Dialog } from '@/components/ui/dialog';
import { workingAsText, WorkingSteps } from '@/components/ui/working-steps';
import type { WorkingStep } from '@/lib/stats/working';

export type WorkingWindowProps = {
  title: string;
  steps: readonly WorkingStep[];
  version: string;
  /** The address of the page without the working. */
  closeTo: string;
};

/** The working that an address asks for, in a window over the page; closing it leads back to the page alone. */
export function WorkingWindow({ title, steps, version, closeTo }: WorkingWindowProps) {
  const router = useRouter();
  return (
    <Dialog
      title={title}
      open
      wide
      onOpenChange={(open) => !open && router.replace(closeTo, { scroll: false })}
    >
      <div className="mb-2 flex justify-end">
        <CopyButton text={workingAsText(steps, version)} label="Copy the working" />
      </div>
      <WorkingSteps steps={steps} version={version} />
    </Dialog>
  );
}
