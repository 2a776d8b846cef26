import { useState } from 'react';
import { MAX_PASSWORD, MIN_PASSWORD } from '#shared/api/accounts.ts';
import { CheckField } from '../ui/CheckField.tsx';
import type { FieldIssue } from '../ui/field-issue.ts';
import { TextField } from '../ui/TextField.tsx';

interface Props {
  readonly label: string;
  readonly value: string;
  readonly onValue: (value: string) => void;
  readonly issues?: readonly FieldIssue[];
  /** A new one is counted and its rules are said; a present one is only typed. */
  readonly use: 'new' | 'present';
}

/** Length in code points: an emoji or a letter of any script is one (NIST SP 800-63B-4). */
export function passwordLength(password: string): number {
  return [...password].length;
}

function newPasswordHint(password: string): string {
  const length = passwordLength(password);
  const rule = `${String(MIN_PASSWORD)} characters or more; spaces, signs and letters of any script count. A few words in a row are good, and no digit or capital is asked for.`;
  if (length === 0) return rule;
  if (length > MAX_PASSWORD) {
    return `${String(length)} characters; at most ${String(MAX_PASSWORD)} are kept.`;
  }
  if (length < MIN_PASSWORD) return `${rule} ${String(MIN_PASSWORD - length)} to go.`;
  return `${String(length)} characters, long enough.`;
}

/** Masked unless its owner looks; pasting and password managers work, nothing is cut off. */
export function PasswordField({ label, value, onValue, issues, use }: Props) {
  const [shown, setShown] = useState(false);
  return (
    <div>
      <TextField
        label={label}
        type={shown ? 'text' : 'password'}
        autoComplete={use === 'new' ? 'new-password' : 'current-password'}
        spellCheck={false}
        required
        value={value}
        onValue={onValue}
        issues={issues}
        hint={use === 'new' ? newPasswordHint(value) : undefined}
      />
      <div className="grid gap-x-5 @2xl:grid-cols-[10.5rem_minmax(0,1fr)]">
        <div className="-mt-1 @2xl:col-start-2">
          <CheckField label="Show what is typed" checked={shown} onChecked={setShown} />
        </div>
      </div>
    </div>
  );
}
