'use client';

import Monitor from 'lucide-react/icons/monitor';
import Moon from 'lucide-react/icons/moon';
import Sun from 'lucide-react/icons/sun';
import { useId, useSyncExternalStore } from 'react';
import { applyTheme, onThemeChange, shownTheme } from './apply-theme';
import type { Theme } from './theme';

export type ThemeSwitchProps = { initial: Theme };

const CHOICES = [
  { theme: 'system', label: 'As the system', Icon: Monitor },
  { theme: 'light', label: 'Light', Icon: Sun },
  { theme: 'dark', label: 'Dark', Icon: Moon },
] as const;

export function ThemeSwitch({ initial }: ThemeSwitchProps) {
  const theme = useSyncExternalStore(onThemeChange, shownTheme, () => initial);
  const name = useId();

  return (
    <fieldset className="inline-flex">
      <legend className="sr-only">Theme</legend>
      {CHOICES.map(({ theme: choice, label, Icon }) => (
        <label
          key={choice}
          title={label}
          className="inline-flex size-11 cursor-pointer items-center justify-center border-b-3 border-transparent text-press has-checked:border-maize has-checked:text-ink has-focus-visible:outline-2 has-focus-visible:outline-press md:size-8"
        >
          <input
            type="radio"
            name={name}
            value={choice}
            checked={theme === choice}
            onChange={() => applyTheme(choice)}
            className="sr-only"
          />
          <span className="sr-only">{label}</span>
          <Icon aria-hidden="true" size={16} />
        </label>
      ))}
    </fieldset>
  );
}
