'use client';

import { useEffect, useRef, useState } from 'react';
import { MAX_BYTES } from '@/lib/results-file/limits';
import type { FileKind } from '@/lib/results-file/result-types';
import { previewOfResults, previewOfTable, type Preview } from './preview';
import { readRowsHere } from './read-in-browser';
import { sendFile, withQuery, type ChosenFile, type Sending } from './send-file';
import type { CheckReport, Setback, UploadOutcome } from './upload-outcome';

/** The share sent, 0 to 1; at 1 the server is reading. */
type Progress = { progress: number };
type Checked = { file: ChosenFile; report: CheckReport; preview: Preview | null };

export type UploadState =
  | { step: 'waiting'; complaint?: string }
  | ({ step: 'checking'; file: ChosenFile } & Progress)
  | { step: 'check-failed'; file: ChosenFile; setback: Setback }
  | ({ step: 'checked' } & Checked)
  | ({ step: 'submitting' } & Checked & Progress)
  | ({ step: 'submit-failed'; setback: Setback } & Checked)
  | ({ step: 'submitted' } & Checked);

export type UploadOptions = {
  address: string;
  kind: FileKind;
  /** Called once, with the server's answer, after the file was taken. */
  onTaken: (answer: Record<string, unknown>) => void;
};

/** Choose, check, look, submit. One request is under way at a time, however often a button is pressed. */
export function useUpload({ address, kind, onTaken }: UploadOptions) {
  const [state, setState] = useState<UploadState>({ step: 'waiting' });
  const sending = useRef<Sending | null>(null);
  const isHere = useRef(true);
  useEffect(() => {
    isHere.current = true;
    return () => {
      isHere.current = false;
    };
  }, []);

  async function send(
    to: string,
    file: ChosenFile,
    onProgress: (progress: number) => void,
  ): Promise<UploadOutcome | null> {
    if (sending.current) return null;
    sending.current = sendFile(to, file, (progress) => isHere.current && onProgress(progress));
    const outcome = await sending.current.done;
    sending.current = null;
    return isHere.current ? outcome : null;
  }

  async function check(file: ChosenFile) {
    setState({ step: 'checking', file, progress: 0 });
    const outcome = await send(withQuery(address, { check: '1' }), file, (progress) =>
      setState({ step: 'checking', file, progress }),
    );
    if (!outcome) return;
    if (outcome.kind !== 'answered' && outcome.kind !== 'refused-file') {
      setState({ step: 'check-failed', file, setback: outcome });
      return;
    }
    const report = outcome.kind === 'answered' ? (outcome.body as CheckReport) : outcome.report;
    const preview = await previewOf(file, report, kind);
    if (isHere.current) setState({ step: 'checked', file, report, preview });
  }

  async function choose(files: readonly File[]) {
    const [file] = files;
    if (!file || sending.current) return;
    const complaint = complaintOf(files);
    if (complaint) {
      setState({ step: 'waiting', complaint });
      return;
    }
    try {
      const bytes = new Blob([await file.arrayBuffer()]);
      await check({ name: file.name, bytes });
    } catch (cause) {
      if (!(cause instanceof DOMException)) throw cause;
      setState({
        step: 'waiting',
        complaint: `${file.name} could not be read (${cause.name}). Choose it again.`,
      });
    }
  }

  async function submit(checked: Checked) {
    if (sending.current) return;
    const kept = { file: checked.file, report: checked.report, preview: checked.preview };
    setState({ step: 'submitting', ...kept, progress: 0 });
    const outcome = await send(address, checked.file, (progress) =>
      setState({ step: 'submitting', ...kept, progress }),
    );
    if (!outcome) return;
    if (outcome.kind === 'answered') {
      setState({ step: 'submitted', ...kept });
      onTaken(outcome.body);
    } else if (outcome.kind === 'refused-file') {
      // The plan was changed between the check and the submission.
      const preview = await previewOf(checked.file, outcome.report, kind);
      setState({ step: 'checked', file: checked.file, report: outcome.report, preview });
    } else {
      setState({ step: 'submit-failed', ...kept, setback: outcome });
    }
  }

  const stop = () => sending.current?.stop();
  const clear = () => setState({ step: 'waiting' });
  return { state, choose, check, submit, stop, clear };
}

function complaintOf(files: readonly File[]): string | null {
  if (files.length > 1) return `Found ${files.length} files. Choose one file.`;
  const size = files[0]?.size ?? 0;
  if (size <= MAX_BYTES) return null;
  return `The file has ${(size / 1e6).toFixed(1)} MB. At most ${Math.floor(MAX_BYTES / 1e6)} MB are taken.`;
}

async function previewOf(file: ChosenFile, report: CheckReport, kind: FileKind): Promise<Preview | null> {
  if (report.ok) return previewOfResults(report.results ?? [], report.notices);
  try {
    const table = await readRowsHere(file.bytes, kind);
    return table && previewOfTable(table, report.problems, report.notices);
  } catch {
    // The code that reads rows in the browser did not arrive; the list of problems is complete without it.
    return null;
  }
}
