'use client';

import { useEffect, useRef, type ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { FileKind } from '@/lib/results-file/result-types';
import { formatBytes, formatDateTime } from '@/lib/format';
import { DropZone } from './drop-zone';
import { PreviewTable } from './preview-table';
import { NoticeList, ProblemList } from './report-messages';
import { SendProgress } from './send-progress';
import { SetbackNotice } from './setback-notice';
import { reportSummary } from './report-summary';
import type { CheckReport } from './upload-outcome';
import { useUpload, type UploadState } from './use-upload';

export type UploadTexts = {
  /** Over the drop zone, as in "Drop the results file here". */
  drop: string;
  hint: string;
  /** The last button, as in "Submit these results". */
  submit: string;
  /** Shown once the file is taken, while the next page is on its way. */
  taken: string;
};

export type UploadFileProps = {
  /** Where the file is posted; with check=1 added it is only checked. */
  address: string;
  kind: FileKind;
  texts: UploadTexts;
  onTaken: (answer: Record<string, unknown>) => void;
  /** Further words about a good file, such as how many laboratories it names. */
  about?: (report: CheckReport) => ReactNode;
};

/** Drop or choose a file, see how it was read, submit it. */
export function UploadFile({ address, kind, texts, onTaken, about }: UploadFileProps) {
  const { state, choose, check, submit, stop, clear } = useUpload({ address, kind, onTaken });
  const outcome = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (state.step === 'checked') outcome.current?.focus();
  }, [state.step]);

  if (state.step === 'waiting') {
    return (
      <DropZone
        label={texts.drop}
        hint={texts.hint}
        choose="Choose a file"
        complaint={state.complaint}
        onFiles={choose}
      />
    );
  }
  return (
    <div className="no-print flex flex-col gap-5">
      <FileLine state={state} onClear={clear} />
      {state.step === 'checking' && (
        <SendProgress
          progress={state.progress}
          sending="Sending the file to be checked"
          waiting="The file is being checked"
          onStop={stop}
        />
      )}
      {state.step === 'check-failed' && (
        <SetbackNotice
          setback={state.setback}
          fileName={state.file.name}
          again="Check again"
          onAgain={() => check(state.file)}
          onClear={clear}
        />
      )}
      {'report' in state && (
        <div ref={outcome} tabIndex={-1} className="flex flex-col gap-5 outline-none">
          <Report report={state.report} about={about} />
          {state.report.ok && (
            <SubmitPart
              state={state}
              texts={texts}
              onSubmit={() => submit(state)}
              onStop={stop}
              onClear={clear}
            />
          )}
          {state.preview && (
            <PreviewTable
              preview={state.preview}
              caption={state.report.ok ? 'How the file was read' : 'The rows of the file'}
            />
          )}
        </div>
      )}
    </div>
  );
}

type ChosenState = Exclude<UploadState, { step: 'waiting' }>;

function FileLine({ state, onClear }: { state: ChosenState; onClear: () => void }) {
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-b pb-2">
      <p className="wrap-anywhere">
        <span className="font-semibold">{state.file.name}</span>{' '}
        <span className="text-ink-soft">{formatBytes(state.file.bytes.size)}</span>
      </p>
      {state.step === 'checked' && (
        <Button size="small" onClick={onClear}>
          Choose another file
        </Button>
      )}
    </div>
  );
}

function Report({ report, about }: { report: CheckReport } & Pick<UploadFileProps, 'about'>) {
  const { title, text } = reportSummary(report);
  return (
    <>
      <Notice kind={report.ok ? 'info' : 'problem'} title={title}>
        {text}
        {report.ok && about?.(report)}
      </Notice>
      {report.wouldReplace && (
        <Notice title="This would be an amendment.">
          It takes the place of receipt {report.wouldReplace.receipt} of{' '}
          {formatDateTime(report.wouldReplace.submittedAt)}, which stays in the record.
        </Notice>
      )}
      {!report.ok && <ProblemList report={report} />}
      <NoticeList report={report} />
    </>
  );
}

type SubmitPartProps = {
  state: Extract<UploadState, { report: CheckReport }>;
  texts: UploadTexts;
  onSubmit: () => void;
  onStop: () => void;
  onClear: () => void;
};

function SubmitPart({ state, texts, onSubmit, onStop, onClear }: SubmitPartProps) {
  if (state.step === 'submitted') return <p role="status">{texts.taken}</p>;
  if (state.step === 'submit-failed') {
    return (
      <SetbackNotice
        setback={state.setback}
        fileName={state.file.name}
        again="Send again"
        onAgain={onSubmit}
        onClear={onClear}
      />
    );
  }
  if (state.step === 'submitting') {
    return (
      <SendProgress
        progress={state.progress}
        sending="Sending the file"
        waiting="The file has been sent and is being written down"
        onStop={onStop}
      />
    );
  }
  return (
    <div>
      <Button variant="primary" onClick={onSubmit}>
        {texts.submit}
      </Button>
    </div>
  );
}
