'use client';

import { type KeyboardEvent, type ReactNode, useId, useState } from 'react';
import { numberAsTyped, typedNumber } from '@/lib/shared/typed-number';
import { classNames } from './class-names';
import { FieldNote } from './field';

export interface NumberFieldProps {
  label: ReactNode;
  /** Stands in the field and is spoken after the label, e.g. "EUR per kg". */
  unit: string;
  value: number | null;
  /** When the field is left, at Enter, and at every step. Never with what cannot be read or lies outside. */
  onChange: (value: number | null) => void;
  min?: number;
  max?: number;
  /** What the arrow keys add; nothing is rounded to it. */
  step?: number;
  /** Digits shown after the point, at most. */
  digits?: number;
  hint?: ReactNode;
  error?: ReactNode;
  disabled?: boolean;
  hideLabel?: boolean;
  name?: string;
  className?: string;
}

/**
 * A number with its unit, typed with a point or a comma. By hand, because the widget library reads "47,35" as 4,735
 * under an English locale and moves what lies outside to the nearest end without a word.
 */
export function NumberField(props: NumberFieldProps) {
  const { label, unit, value, hint, error, disabled, hideLabel, name, className } = props;
  const id = useId();
  const field = useTypedNumber(props);
  const note = field.fault ?? error;
  return (
    <div className={classNames('grid content-start gap-1.5', className)}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'font-[560]'}>
        {label}
        <span className="sr-only">, {unit}</span>
      </label>
      <span
        className={classNames(
          'flex min-h-10 overflow-hidden rounded-tile border bg-paper hover:border-ink focus-within:border-ink',
          'has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink',
          note ? 'border-2 border-ink' : 'border-rule',
          disabled && 'opacity-50',
        )}
      >
        <input
          id={id}
          inputMode="decimal"
          autoComplete="off"
          disabled={disabled}
          aria-invalid={note ? true : undefined}
          aria-describedby={note || hint ? `${id}-note` : undefined}
          className="figures w-full min-w-0 flex-1 bg-transparent px-3 text-body outline-none md:text-data"
          value={field.shown}
          onChange={(event) => field.type(event.target.value)}
          onBlur={field.leave}
          onKeyDown={field.onKeyDown}
        />
        <span aria-hidden="true" className="grid flex-none place-items-center pr-2 text-ink-soft">
          {unit}
        </span>
        <Steps onStep={field.stepBy} disabled={disabled} />
      </span>
      {name ? <input type="hidden" name={name} value={value ?? ''} /> : null}
      <div role={note ? 'alert' : undefined}>
        <FieldNote id={`${id}-note`} hint={hint} error={note} />
      </div>
    </div>
  );
}

/** What is being typed stays as typed until it is left; a fault keeps it there, beside its sentence. */
function useTypedNumber({ value, onChange, min, max, step = 1, digits = 3, unit }: NumberFieldProps) {
  const [typed, setTyped] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);

  function take(next: number | null): boolean {
    const outside = next === null ? null : outsideInWords(next, min, max, unit);
    setFault(outside);
    if (outside) return false;
    setTyped(null);
    if (next !== value) onChange(next);
    return true;
  }
  function leave() {
    if (typed === null) return;
    const read = typedNumber(typed);
    if ('fault' in read) setFault(read.fault);
    else take(read.value);
  }
  function stepBy(direction: 1 | -1) {
    const read = typed === null ? { value } : typedNumber(typed);
    const from = 'value' in read ? (read.value ?? min ?? 0) : (value ?? min ?? 0);
    // Steps such as 0.1 leave crumbs in binary; what is shown is what is meant.
    const to = Number((from + direction * step).toFixed(Math.max(digits, 6)));
    take(Math.min(max ?? to, Math.max(min ?? to, to)));
  }
  function onKeyDown(event: KeyboardEvent) {
    if (event.key === 'Enter') leave();
    else if (event.key === 'Escape' && typed !== null) {
      event.stopPropagation();
      setTyped(null);
      setFault(null);
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      stepBy(event.key === 'ArrowUp' ? 1 : -1);
    }
  }
  return { shown: typed ?? numberAsTyped(value, digits), fault, type: setTyped, leave, stepBy, onKeyDown };
}

function outsideInWords(value: number, min: number | undefined, max: number | undefined, unit: string): string | null {
  if (min !== undefined && value < min) return `At least ${min} ${unit}; it was ${value}.`;
  if (max !== undefined && value > max) return `At most ${max} ${unit}; it was ${value}.`;
  return null;
}

/** For a mouse; keys have their arrows, and fingers their number pad. */
function Steps({ onStep, disabled }: { onStep: (direction: 1 | -1) => void; disabled?: boolean }) {
  return (
    <span aria-hidden="true" className="hidden flex-none border-l border-grout pointer-fine:grid" data-print="no">
      {([1, -1] as const).map((direction) => (
        <button
          key={direction}
          type="button"
          tabIndex={-1}
          disabled={disabled}
          onClick={() => onStep(direction)}
          className={classNames('grid w-6 place-items-center hover:bg-wash', direction < 0 && 'border-t border-grout')}
        >
          <svg viewBox="0 0 8 5" width="8" height="5" aria-hidden="true">
            <path
              d={direction > 0 ? 'm1 4 3-3 3 3' : 'm1 1 3 3 3-3'}
              fill="none"
              stroke="currentColor"
              strokeWidth="1.3"
            />
          </svg>
        </button>
      ))}
    </span>
  );
}
