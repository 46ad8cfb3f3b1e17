import { Button } from '@/components/ui/button';

export type SendProgressProps = { progress: number; sending: string; waiting: string; onStop: () => void };

/** How much of the file has left the browser; once it is all sent, that the server is at it. */
export function SendProgress({ progress, sending, waiting, onStop }: SendProgressProps) {
  const percent = Math.floor(progress * 100);
  const isSent = progress >= 1;
  return (
    <div className="flex flex-col items-start gap-2 border-y py-4">
      <p role="status" className="font-semibold">
        {isSent ? waiting : sending}
      </p>
      <div className="flex w-full max-w-measure items-center gap-3">
        <progress
          aria-label="Sent"
          value={isSent ? undefined : percent}
          max={100}
          className="h-2 flex-1 accent-press"
        />
        <span className="figures w-12 text-right">{percent} %</span>
      </div>
      <Button variant="quiet" size="small" onClick={onStop}>
        Stop
      </Button>
    </div>
  );
}
