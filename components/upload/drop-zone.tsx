'use client';

import { useEffect, useEffectEvent, useId, useRef, useState, type DragEvent } from 'react';
import { buttonStyle } from '@/components/ui/button-style';
import { cx } from '@/components/ui/cx';

export type DropZoneProps = {
  label: string;
  hint: string;
  /** The words on the button. */
  choose: string;
  complaint?: string;
  onFiles: (files: readonly File[]) => void;
};

const ACCEPT = '.csv,.tsv,.txt,text/csv,text/tab-separated-values,text/plain';

/** A place to drop a file on, which is a plain file field for those who do not drag. */
export function DropZone({ label, hint, choose, complaint, onFiles }: DropZoneProps) {
  const id = useId();
  const [isOver, setIsOver] = useState(false);
  const field = useRef<HTMLInputElement>(null);

  function takeChosen() {
    const files = [...(field.current?.files ?? [])];
    if (files.length === 0 || !field.current) return;
    // Choosing the same file again after mending it must count as a change.
    field.current.value = '';
    onFiles(files);
  }

  // On a slow line a file may be chosen before the page listens.
  const takeEarly = useEffectEvent(takeChosen);
  useEffect(() => takeEarly(), []);

  function onDrop(event: DragEvent) {
    event.preventDefault();
    setIsOver(false);
    onFiles([...event.dataTransfer.files]);
  }

  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setIsOver(true);
      }}
      onDragLeave={(event) => {
        if (!event.currentTarget.contains(event.relatedTarget as Node | null)) setIsOver(false);
      }}
      onDrop={onDrop}
      className={cx(
        'no-print flex flex-col items-start gap-3 border border-dashed border-rule-strong px-5 py-6',
        isOver ? 'bg-maize-wash' : 'bg-paper-raised',
      )}
    >
      <p className="font-serif text-lg font-semibold">{label}</p>
      <p id={`${id}-hint`} className="max-w-measure text-ink-soft">
        {hint}
      </p>
      <label
        htmlFor={id}
        className={cx(
          buttonStyle('primary'),
          'has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-press',
        )}
      >
        {choose}
        <input
          ref={field}
          id={id}
          type="file"
          accept={ACCEPT}
          aria-describedby={`${id}-hint`}
          className="sr-only"
          onChange={takeChosen}
        />
      </label>
      <div aria-live="polite">{complaint && <p className="font-semibold text-action">{complaint}</p>}</div>
    </div>
  );
}
