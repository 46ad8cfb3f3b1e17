'use client';

import { useEffect, useRef, type KeyboardEvent, type MouseEvent, type ReactNode } from 'react';

/** A panel below a button in the header. Without script it still opens and closes. */
export function DropDown({ label, children }: { label: ReactNode; children: ReactNode }) {
  const details = useRef<HTMLDetailsElement>(null);
  const close = () => details.current?.removeAttribute('open');

  useEffect(() => {
    function onPointerDown(event: PointerEvent) {
      if (event.target instanceof Node && !details.current?.contains(event.target)) close();
    }
    document.addEventListener('pointerdown', onPointerDown);
    return () => document.removeEventListener('pointerdown', onPointerDown);
  }, []);

  function onKeyDown(event: KeyboardEvent) {
    if (event.key !== 'Escape') return;
    close();
    details.current?.querySelector('summary')?.focus();
  }

  function onClick(event: MouseEvent) {
    if (event.target instanceof Element && event.target.closest('a')) close();
  }

  return (
    // It may have been opened before the script came, which is no mistake.
    <details
      suppressHydrationWarning
      ref={details}
      onKeyDown={onKeyDown}
      onClick={onClick}
      className="group relative"
    >
      <summary className="flex min-h-9 max-w-56 list-none items-center gap-1.5 font-semibold text-press hover:text-press-strong [&::-webkit-details-marker]:hidden">
        <span className="truncate">{label}</span>
        <svg
          viewBox="0 0 10 6"
          aria-hidden="true"
          className="w-2.5 shrink-0 fill-none stroke-current group-open:rotate-180"
        >
          <path d="m1 1 4 4 4-4" strokeWidth="1.6" />
        </svg>
      </summary>
      <div className="absolute right-0 z-50 mt-1 w-72 rounded-xs border border-rule-strong bg-paper-raised p-4">
        {children}
      </div>
    </details>
  );
}
