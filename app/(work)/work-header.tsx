'use client';

import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { SiteHeader } from '@/components/ui/site-header';
import { placeOf, type Place } from './navigation';

/** Marks the current place; layouts are not rendered again on the way, so the browser has to tell. */
export function WorkHeader({ home, links, right }: { home: string; links: Place[]; right: ReactNode }) {
  const current = placeOf(links, usePathname());
  return (
    <SiteHeader
      home={home}
      links={links.map((link) => ({ ...link, current: link.href === current }))}
      right={right}
    />
  );
}
