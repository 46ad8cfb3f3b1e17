'use client';

import { useRef, type KeyboardEvent, type MouseEvent, type ReactNode } from 'react';

/** The navigation on small screens. Without script it still opens; with it, following a link closes it. */
export function HeaderMenu({ children }: { children: ReactNode }) {
  const details = useRef<HTMLDetailsElement>(null);
  const close = () => details.current?.removeAttribute('open');

  function onClick(event: MouseEvent) {
    if (event.target instanceof Element && event.target.closest('a')) close();
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.key !== 'Escape') return;
    close();
    details.current?.querySelector('summary')?.focus();
  }

  return (
    <details ref={details} onClick={onClick} onKeyDown={onKeyDown} className="group md:hidden">
      <summary className="flex min-h-11 list-none items-center gap-2 font-semibold text-press [&::-webkit-details-marker]:hidden">
        <svg viewBox="0 0 18 12" aria-hidden="true" className="w-4.5 stroke-current group-open:hidden">
          <path d="M0 1h18M0 6h18M0 11h18" strokeWidth="1.6" />
        </svg>
        <svg viewBox="0 0 18 12" aria-hidden="true" className="hidden w-4.5 stroke-current group-open:block">
          <path d="m4 1 10 10M14 1 4 11" strokeWidth="1.6" />
        </svg>
        Menu
      </summary>
      {children}
    </details>
  );
}
