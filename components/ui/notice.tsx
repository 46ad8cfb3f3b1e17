import type { ReactNode } from 'react';
import { cx } from './cx';
import { FilledSquare, InfoMark, OpenTriangle, Tick } from './shapes';

export type NoticeKind = 'info' | 'warning' | 'problem' | 'done';
export type NoticeProps = { kind?: NoticeKind; title?: ReactNode; children?: ReactNode; className?: string };

const WORDS: Record<NoticeKind, string> = {
  info: 'Note',
  warning: 'Warning',
  problem: 'Problem',
  done: 'Done',
};
const EDGES: Record<NoticeKind, string> = {
  info: 'border-rule-strong',
  warning: 'border-warning',
  problem: 'border-action',
  done: 'border-ink',
};
const WORD_COLOURS: Record<NoticeKind, string> = {
  info: 'text-ink',
  warning: 'text-warning',
  problem: 'text-action',
  done: 'text-ink',
};
const SHAPES = { info: InfoMark, warning: OpenTriangle, problem: FilledSquare, done: Tick };

export function Notice({ kind = 'info', title, children, className }: NoticeProps) {
  const Shape = SHAPES[kind];
  return (
    <div className={cx('border-l-2 py-0.5 pl-3', EDGES[kind], className)}>
      <p className="flex flex-wrap items-baseline gap-x-2">
        <strong className={cx('inline-flex items-baseline gap-1.5', WORD_COLOURS[kind])}>
          <Shape />
          {WORDS[kind]}
        </strong>
        {title && <span className="font-semibold">{title}</span>}
      </p>
      {children && <div className="mt-0.5 max-w-measure">{children}</div>}
    </div>
  );
}
