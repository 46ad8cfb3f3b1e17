import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { Setback } from './upload-outcome';

export type SetbackNoticeProps = {
  setback: Setback;
  fileName: string;
  again: string;
  onAgain: () => void;
  onClear: () => void;
};

/** What happened, what was kept and what to do when sending came to nothing. */
export function SetbackNotice({ setback, fileName, again, onAgain, onClear }: SetbackNoticeProps) {
  const { title, text } = wordsOf(setback, fileName, again);
  return (
    <div role="alert" className="flex flex-col items-start gap-3">
      <Notice kind={setback.kind === 'stopped' ? 'info' : 'problem'} title={title}>
        {text}
      </Notice>
      <div className="flex flex-wrap gap-2">
        <Button variant="primary" onClick={onAgain}>
          {again}
        </Button>
        <Button variant="quiet" onClick={onClear}>
          Choose another file
        </Button>
      </div>
    </div>
  );
}

function wordsOf(setback: Setback, fileName: string, again: string): { title: string; text: ReactNode } {
  const kept = `${fileName} is kept here.`;
  switch (setback.kind) {
    case 'unreachable':
      return {
        title: 'The connection was lost.',
        text: `${kept} It may have arrived all the same; press \u201c${again}\u201d when you are connected. The same file sent twice counts once.`,
      };
    case 'stopped':
      return { title: 'Sending was stopped.', text: `${kept} Press \u201c${again}\u201d to go on.` };
    case 'not-signed-in':
      return {
        title: 'Your sign-in has ended.',
        text: (
          <>
            {kept} Nothing was submitted.{' '}
            <a href="/sign-in" target="_blank" rel="noreferrer" className="text-link">
              Sign in again in a new window
            </a>
            , come back here and press {`\u201c${again}\u201d`}.
          </>
        ),
      };
    case 'refused':
      return { title: 'The file was not taken.', text: `${setback.detail} ${kept}` };
    case 'fault':
      return { title: 'Something went wrong on the server.', text: `${setback.detail} ${kept}` };
  }
}
