'use client';

import { useId } from 'react';
import { classNames } from './class-names';

export interface ChoiceProps<T extends string> {
  /** Names the group; said, and seen unless hidden. */
  label: string;
  hideLabel?: boolean;
  value: T;
  onChange: (value: T) => void;
  options: readonly { value: T; label: string }[];
  className?: string;
}

/** One of a few, all in sight: radio buttons that stand side by side like tiles. */
export function Choice<T extends string>({ label, hideLabel, value, onChange, options, className }: ChoiceProps<T>) {
  const name = useId();
  return (
    <fieldset className={classNames('grid gap-1.5', className)}>
      <legend className={hideLabel ? 'sr-only' : 'mb-1.5 font-[560]'}>{label}</legend>
      <div className="inline-flex w-fit max-w-full flex-wrap gap-px rounded-tile border border-rule bg-grout">
        {options.map((option) => (
          <label
            key={option.value}
            className="relative grid min-h-8 flex-auto place-items-center bg-paper px-3 text-center has-checked:bg-ink has-checked:text-on-ink has-[:focus-visible]:outline-2 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-ink hover:not-has-checked:bg-wash"
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
              className="absolute inset-0 appearance-none outline-none"
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
