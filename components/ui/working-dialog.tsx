'use client';

import { useState, useTransition, type ReactNode } from 'react';
import type { WorkingStep } from '@/lib/stats/working';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style';
import { CopyButton } from './copy-button';
import { Dialog } from './dialog';
import { Notice } from './notice';
import { WorkingSteps, workingAsText } from './working-steps';

export type WorkingDialogProps = {
  title: ReactNode;
  steps?: readonly WorkingStep[];
  load?: () => Promise<readonly WorkingStep[]>;
  version?: string;
  label?: ReactNode;
  triggerVariant?: ButtonVariant;
  triggerSize?: ButtonSize;
};

/** A button that opens the working: given with the page, or fetched by `load` when it is asked for. */
export function WorkingDialog({
  title,
  steps: given,
  load,
  version,
  label = 'Show the working',
  triggerVariant = 'quiet',
  triggerSize = 'small',
}: WorkingDialogProps) {
  const [open, setOpen] = useState(false);
  const [fetched, setFetched] = useState<readonly WorkingStep[]>();
  const [failed, setFailed] = useState(false);
  const [pending, startTransition] = useTransition();
  const steps = given ?? fetched;

  function onOpen() {
    setOpen(true);
    if (steps || !load) return;
    setFailed(false);
    startTransition(async () => {
      try {
        setFetched(await load());
      } catch {
        // The server logs the fault; the reader only needs to know that nothing came.
        setFailed(true);
      }
    });
  }

  return (
    <>
      <button
        type="button"
        aria-haspopup="dialog"
        onClick={onOpen}
        className={`${buttonStyle(triggerVariant, triggerSize)} no-print`}
      >
        {label}
      </button>
      <Dialog title={title} open={open} onOpenChange={setOpen} wide>
        {steps && (
          <>
            <div className="mb-2 flex justify-end">
              <CopyButton text={workingAsText(steps, version)} label="Copy the working" />
            </div>
            <WorkingSteps steps={steps} version={version} />
          </>
        )}
        {pending && <p role="status">Fetching the working</p>}
        {failed && (
          <Notice kind="problem">
            The working could not be fetched. Close this and open it again to try once more.
          </Notice>
        )}
      </Dialog>
    </>
  );
}
