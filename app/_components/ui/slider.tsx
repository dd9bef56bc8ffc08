'use client';

import type { ReactNode } from 'react';
import { Label } from 'react-aria-components/Label';
import { Slider as AriaSlider, SliderOutput, SliderThumb, SliderTrack } from 'react-aria-components/Slider';
import { classNames } from './class-names';

export interface SliderProps {
  label: ReactNode;
  value: number;
  /** While dragging, at every move. */
  onChange: (value: number) => void;
  /** Once, when let go. */
  onChangeEnd?: (value: number) => void;
  min: number;
  max: number;
  step?: number;
  /** How many equal parts the graduation has; every fifth mark is longer. */
  graduations?: number;
  unit?: string;
  formatOptions?: Intl.NumberFormatOptions;
  /** At the left and right end, e.g. "cheaper", "closer". */
  ends?: [ReactNode, ReactNode];
  disabled?: boolean;
  className?: string;
}

/** A pipette laid flat: a graduated line, filled with ink up to the value. Also by arrows, Page keys, Home and End. */
export function Slider(props: SliderProps) {
  const {
    label,
    value,
    onChange,
    onChangeEnd,
    min,
    max,
    step,
    graduations = 20,
    unit,
    formatOptions,
    ends,
    disabled,
    className,
  } = props;
  return (
    <AriaSlider
      value={value}
      onChange={(next) => onChange(one(next))}
      onChangeEnd={onChangeEnd ? (next) => onChangeEnd(one(next)) : undefined}
      minValue={min}
      maxValue={max}
      step={step}
      formatOptions={formatOptions}
      isDisabled={disabled}
      className={classNames('grid gap-1 data-[disabled]:opacity-45', className)}
    >
      <div className="flex items-baseline justify-between gap-3">
        <Label className="font-[560]">{label}</Label>
        <SliderOutput className="figures whitespace-nowrap">
          {({ state }) => (unit ? `${state.getThumbValueLabel(0)} ${unit}` : state.getThumbValueLabel(0))}
        </SliderOutput>
      </div>
      <SliderTrack className="relative mx-[7px] h-10 touch-none">
        {({ state }) => (
          <>
            <Graduation parts={graduations} />
            <span className="absolute inset-x-0 top-[13px] h-px bg-rule" />
            <span
              className="absolute top-[11px] left-0 h-[5px] bg-ink"
              style={{ width: `${state.getThumbPercent(0) * 100}%` }}
            />
            <SliderThumb className="group top-[13px] grid size-7 place-items-center data-[focus-visible]:outline-none">
              <span className="h-7 w-3.5 rounded-[7px] border-[1.5px] border-ink bg-paper transition-transform group-data-[dragging]:scale-y-110 group-data-[focus-visible]:outline-2 group-data-[focus-visible]:outline-offset-2 group-data-[focus-visible]:outline-ink" />
            </SliderThumb>
          </>
        )}
      </SliderTrack>
      {ends ? (
        <div className="narrow -mt-1 flex justify-between text-note text-ink-soft">
          <span>{ends[0]}</span>
          <span>{ends[1]}</span>
        </div>
      ) : null}
    </AriaSlider>
  );
}

const one = (value: number | number[]): number => (Array.isArray(value) ? (value[0] ?? 0) : value);

function Graduation({ parts }: { parts: number }) {
  const marks = Array.from({ length: parts + 1 }, (_, index) => index);
  return (
    <svg className="absolute top-[20px] left-0 h-3 w-full overflow-visible" aria-hidden="true">
      {marks.map((mark) => (
        <line
          key={mark}
          x1={`${(mark / parts) * 100}%`}
          x2={`${(mark / parts) * 100}%`}
          y1="0"
          y2={mark % 5 === 0 ? 10 : 5}
          style={{ stroke: 'var(--rule)' }}
        />
      ))}
    </svg>
  );
}
