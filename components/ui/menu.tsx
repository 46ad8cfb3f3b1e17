'use client';

import ChevronDown from 'lucide-react/icons/chevron-down';
import Link from 'next/link';
import * as Radix from 'radix-ui/dropdown-menu';
import type { ReactNode } from 'react';
import { buttonStyle, type ButtonSize, type ButtonVariant } from './button-style';
import { cx } from './cx';

export type MenuItem =
  | { kind?: 'link'; label: ReactNode; href: string; current?: boolean }
  | { kind: 'button'; label: ReactNode; onSelect: () => void; danger?: boolean; disabled?: boolean }
  | { kind: 'heading'; label: ReactNode }
  | { kind: 'rule' };
export type MenuProps = {
  label: ReactNode;
  accessibleLabel?: string;
  items: MenuItem[];
  variant?: ButtonVariant;
  size?: ButtonSize;
};

const ITEM =
  'flex min-h-11 cursor-pointer items-center border-l-3 border-transparent px-3 outline-none select-none md:min-h-8 ' +
  'data-highlighted:bg-paper-wash data-disabled:cursor-not-allowed data-disabled:text-ink-faint';

export function Menu({ label, accessibleLabel, items, variant = 'quiet', size = 'normal' }: MenuProps) {
  return (
    <Radix.Root modal={false}>
      <Radix.Trigger className={buttonStyle(variant, size)} aria-label={accessibleLabel}>
        {label}
        <ChevronDown aria-hidden="true" size={16} />
      </Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align="end"
          sideOffset={4}
          collisionPadding={8}
          className="z-50 min-w-48 max-w-80 rounded-xs border border-rule-strong bg-paper-raised py-1 text-ink"
        >
          {items.map((item, index) => (
            <MenuEntry key={index} item={item} />
          ))}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

function MenuEntry({ item }: { item: MenuItem }) {
  if (item.kind === 'rule') return <Radix.Separator className="my-1 border-t" />;
  if (item.kind === 'heading') {
    return <Radix.Label className="px-3 pt-1.5 pb-0.5 text-sm text-ink-soft">{item.label}</Radix.Label>;
  }
  if (item.kind === 'button') {
    return (
      <Radix.Item
        disabled={item.disabled}
        onSelect={item.onSelect}
        className={cx(ITEM, item.danger ? 'text-action' : 'text-press')}
      >
        {item.label}
      </Radix.Item>
    );
  }
  return (
    <Radix.Item asChild>
      <Link
        href={item.href}
        aria-current={item.current ? 'true' : undefined}
        className={cx(ITEM, item.current ? 'border-l-maize font-semibold text-ink' : 'text-press')}
      >
        {item.label}
      </Link>
    </Radix.Item>
  );
}
