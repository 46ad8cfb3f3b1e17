import type { ReactNode } from 'react';
import { cx } from './cx';

export type Fact = { label: ReactNode; value: ReactNode; hint?: ReactNode };
export type FactsProps = { items: Fact[]; columns?: 1 | 2 | 3; className?: string };

const COLUMNS = { 1: '', 2: 'md:grid-cols-2', 3: 'md:grid-cols-2 xl:grid-cols-3' };

export function Facts({ items, columns = 1, className }: FactsProps) {
  return (
    <dl className={cx('grid grid-cols-1 gap-x-10 border-t', COLUMNS[columns], className)}>
      {items.map((item, index) => (
        <div key={index} className="flex flex-wrap items-baseline justify-between gap-x-4 border-b py-1.5">
          <dt className="text-ink-soft">{item.label}</dt>
          <dd className="ml-auto text-right font-semibold tabular-nums wrap-anywhere">
            {item.value}
            {item.hint && <span className="block text-sm font-normal text-ink-soft">{item.hint}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
