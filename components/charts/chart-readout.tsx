'use client';

import {
  useRef,
  useState,
  type FocusEvent,
  type KeyboardEvent,
  type PointerEvent,
  type ReactNode,
} from 'react';
import { nextMark } from './next-mark';

type Shown = { text: string; left: number; top: number };

/** Shows the detail of the mark under the pointer or the focus, and moves the focus by arrow keys. */
export function ChartReadout({ children }: { children: ReactNode }) {
  const area = useRef<HTMLDivElement>(null);
  const [shown, setShown] = useState<Shown | null>(null);

  function show(target: EventTarget) {
    const mark = target instanceof Element ? target.closest<SVGElement>('[data-detail]') : null;
    const frame = area.current?.getBoundingClientRect();
    if (!mark || !frame) {
      setShown(null);
      return;
    }
    const box = mark.getBoundingClientRect();
    setShown({
      text: mark.dataset.detail ?? '',
      left: box.left + box.width / 2 - frame.left,
      top: box.top - frame.top,
    });
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.key === 'Escape') setShown(null);
    const mark = event.target instanceof SVGElement ? event.target : null;
    const marks = [...(mark?.closest('svg')?.querySelectorAll<SVGElement>('.chart-mark') ?? [])];
    const next = mark ? marks[nextMark(event.key, marks.indexOf(mark), marks.length)] : undefined;
    if (!mark || !next || next === mark) return;
    event.preventDefault();
    mark.setAttribute('tabindex', '-1');
    next.setAttribute('tabindex', '0');
    next.focus();
  }

  return (
    <div
      ref={area}
      className="relative"
      onPointerOver={(event: PointerEvent) => show(event.target)}
      onPointerLeave={() => setShown(null)}
      onFocus={(event: FocusEvent) => show(event.target)}
      onBlur={() => setShown(null)}
      onKeyDown={onKeyDown}
    >
      {children}
      {shown && (
        <div
          aria-hidden="true"
          className="pointer-events-none absolute z-20 w-max max-w-60 -translate-x-1/2 -translate-y-full rounded-xs border border-rule-strong bg-paper-raised px-2 py-1 text-sm leading-snug"
          style={{ left: `clamp(7.5rem, ${shown.left}px, calc(100% - 7.5rem))`, top: shown.top - 6 }}
        >
          {shown.text}
        </div>
      )}
    </div>
  );
}
