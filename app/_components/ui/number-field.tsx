'use client';

import type { ReactNode } from 'react';
import { Button as Step } from 'react-aria-components/Button';
import { Group } from 'react-aria-components/Group';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { NumberField as AriaNumberField } from 'react-aria-components/NumberField';
import { classNames } from './class-names';
import { FieldNote } from './field';

export interface NumberFieldProps {
  label: ReactNode;
  /** Spoken after the label where the label does not say it, e.g. "EUR per kg". */
  unit: string;
  value: number | null;
  onChange: (value: number | null) => void;
  min?: number;
  max?: number;
  step?: number;
  /** Digits after the point, at most. */
  digits?: number;
  hint?: ReactNode;
  error?: ReactNode;
  disabled?: boolean;
  hideLabel?: boolean;
  name?: string;
  className?: string;
}

/** A number with its unit in the field: decimal comma or point, arrows step, empty is null. */
export function NumberField(props: NumberFieldProps) {
  const {
    label,
    unit,
    value,
    onChange,
    min,
    max,
    step,
    digits = 3,
    hint,
    error,
    disabled,
    hideLabel,
    name,
    className,
  } = props;
  return (
    <AriaNumberField
      value={value ?? Number.NaN}
      onChange={(next) => onChange(Number.isNaN(next) ? null : next)}
      minValue={min}
      maxValue={max}
      step={step}
      isDisabled={disabled}
      isInvalid={Boolean(error)}
      name={name}
      formatOptions={{ maximumFractionDigits: digits }}
      className={classNames('grid content-start gap-1.5', className)}
    >
      <Label className={hideLabel ? 'sr-only' : 'font-[560]'}>
        {label}
        <span className="sr-only">, {unit}</span>
      </Label>
      <Group className="group flex min-h-10 overflow-hidden rounded-tile border border-rule bg-paper hover:border-ink has-[input:focus]:border-ink data-[invalid]:border-2 data-[invalid]:border-ink data-[disabled]:opacity-50">
        <Input className="figures w-full min-w-0 flex-1 bg-transparent px-3 text-body outline-none md:text-data" />
        <span aria-hidden="true" className="grid flex-none place-items-center pr-2 text-ink-soft">
          {unit}
        </span>
        <span className="hidden flex-none border-l border-grout pointer-fine:grid" data-print="no">
          <Step slot="increment" className="grid w-6 place-items-center hover:bg-wash data-[disabled]:opacity-30">
            <Arrow d="m1 4 3-3 3 3" />
          </Step>
          <Step
            slot="decrement"
            className="grid w-6 place-items-center border-t border-grout hover:bg-wash data-[disabled]:opacity-30"
          >
            <Arrow d="m1 1 3 3 3-3" />
          </Step>
        </span>
      </Group>
      <NumberNote hint={hint} error={error} />
    </AriaNumberField>
  );
}

function NumberNote({ hint, error }: { hint?: ReactNode; error?: ReactNode }) {
  return hint || error ? (
    <div role={error ? 'alert' : undefined}>
      <FieldNote id="" hint={hint} error={error} />
    </div>
  ) : null;
}

const Arrow = ({ d }: { d: string }) => (
  <svg viewBox="0 0 8 5" width="8" height="5" aria-hidden="true">
    <path d={d} fill="none" stroke="currentColor" strokeWidth="1.3" />
  </svg>
);
