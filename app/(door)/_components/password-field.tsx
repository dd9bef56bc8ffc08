'use client';

import { useId, useState } from 'react';
import { classNames } from '@/app/_components/ui/class-names';
import { FieldFrame, inputClasses } from '@/app/_components/ui/field';

export interface PasswordFieldProps {
  /** Tells a password manager whether to fill or to suggest. */
  autoComplete: 'current-password' | 'new-password';
  hint?: string;
  error?: string;
}

/** Can be pasted into, filled by a manager, and looked at. */
export function PasswordField({ autoComplete, hint, error }: PasswordFieldProps) {
  const id = useId();
  const [shown, setShown] = useState(false);
  return (
    <FieldFrame id={id} label="Password" hint={hint} error={error}>
      <span className="relative block">
        <input
          id={id}
          name="password"
          type={shown ? 'text' : 'password'}
          autoComplete={autoComplete}
          aria-invalid={error ? true : undefined}
          aria-describedby={error || hint ? `${id}-note` : undefined}
          spellCheck={false}
          autoCapitalize="none"
          className={classNames(inputClasses, 'pr-16')}
        />
        <button
          type="button"
          aria-pressed={shown}
          onClick={() => setShown(!shown)}
          className="absolute inset-y-1 right-1 rounded-tile px-3 text-ink-soft hover:bg-wash hover:text-ink"
        >
          {shown ? 'Hide' : 'Show'}
          <span className="sr-only"> the password</span>
        </button>
      </span>
    </FieldFrame>
  );
}
