'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useEffectEvent } from 'react';
import useSWR from 'swr';

export interface ProgressCounts {
  enrolled: number;
  submitted: number;
  lastSubmittedAt: string | null;
  state: string;
}

export type ProgressWatchProps = { address: string; shown: ProgressCounts };

const EVERY_MS = 10_000;

async function fetchProgress(address: string): Promise<ProgressCounts> {
  const response = await fetch(address);
  if (!response.ok) throw new Error(`progress answered ${response.status}`);
  return (await response.json()) as ProgressCounts;
}

/** Asks for the counts of a round while the page is looked at, and renews the page when they have changed. */
export function ProgressWatch({ address, shown }: ProgressWatchProps) {
  const router = useRouter();
  const { data, error } = useSWR<ProgressCounts, Error>(address, fetchProgress, {
    refreshInterval: EVERY_MS,
  });
  const refresh = useEffectEvent(() => router.refresh());
  const isNew =
    data !== undefined &&
    (data.state !== shown.state ||
      data.enrolled !== shown.enrolled ||
      data.submitted !== shown.submitted ||
      data.lastSubmittedAt !== shown.lastSubmittedAt);
  useEffect(() => {
    if (isNew) refresh();
  }, [isNew]);
  return (
    <p className="text-sm text-ink-soft" aria-live="polite">
      {error ? 'This page could not be refreshed just now; it tries again.' : 'This page refreshes itself.'}
    </p>
  );
}
