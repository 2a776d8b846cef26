import { useState } from 'react';
import { Icon } from './Icon.tsx';
import { rememberThemeChoice, storedThemeChoice } from './theme.ts';
import type { ThemeChoice } from './theme.ts';

const CHOICES: readonly { readonly value: ThemeChoice; readonly label: string }[] = [
  { value: 'system', label: 'As the device' },
  { value: 'day', label: 'Day' },
  { value: 'dusk', label: 'Dusk' },
];

/** Day, dusk, or as the device. */
export function ThemeSwitch() {
  const [choice, setChoice] = useState(storedThemeChoice);
  return (
    <div role="group" aria-label="Theme" className="inline-flex">
      {CHOICES.map(({ value, label }) => (
        <button
          key={value}
          type="button"
          aria-pressed={choice === value}
          aria-label={label}
          title={label}
          onClick={() => {
            rememberThemeChoice(value);
            setChoice(value);
          }}
          className="-ml-px inline-flex size-8 items-center justify-center border border-line text-soot-2 hover:text-soot aria-pressed:z-10 aria-pressed:border-soot-2 aria-pressed:bg-verdigris-tint aria-pressed:text-verdigris-ink touch:size-11 focus-visible:z-20"
        >
          <Icon name={value} />
        </button>
      ))}
    </div>
  );
}
