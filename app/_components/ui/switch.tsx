import { type ComponentProps, type ReactNode, useId } from 'react';
import { classNames } from './class-names';

type SwitchProps = Omit<ComponentProps<'input'>, 'type' | 'id' | 'role'> & { label: ReactNode; hint?: ReactNode };

/** On or off, at once. A checkbox underneath, so that forms and keys know it. */
export function Switch({ label, hint, className, ...rest }: SwitchProps) {
  const id = useId();
  return (
    <div className={classNames('grid grid-cols-[auto_1fr] items-start gap-x-3', className)}>
      <span className="relative mt-0.5 inline-grid">
        <input
          id={id}
          type="checkbox"
          // biome-ignore lint/a11y/useAriaPropsForRole: a checkbox tells its own state, and a second word could lie
          role="switch"
          aria-describedby={hint ? `${id}-note` : undefined}
          className="peer h-5 w-9 appearance-none rounded-strip border border-rule bg-paper checked:border-ink checked:bg-ink disabled:opacity-45"
          {...rest}
        />
        <span
          aria-hidden="true"
          className="pointer-events-none absolute top-1 left-1 size-3 rounded-strip bg-rule transition-transform duration-150 peer-checked:translate-x-4 peer-checked:bg-on-ink"
        />
      </span>
      <label htmlFor={id} className="min-h-6 pt-0.5">
        {label}
      </label>
      {hint ? (
        <p id={`${id}-note`} className="col-start-2 text-ink-soft">
          {hint}
        </p>
      ) : null}
    </div>
  );
}

type CheckboxProps = Omit<ComponentProps<'input'>, 'type' | 'id'> & { label: ReactNode; hideLabel?: boolean };

export function Checkbox({ label, hideLabel, className, ...rest }: CheckboxProps) {
  const id = useId();
  return (
    <span className={classNames('relative inline-flex min-h-6 items-center gap-2', className)}>
      <input
        id={id}
        type="checkbox"
        className="peer size-[18px] flex-none appearance-none rounded-tile border border-rule bg-paper checked:border-ink checked:bg-ink"
        {...rest}
      />
      <svg
        viewBox="0 0 12 10"
        width="12"
        height="10"
        aria-hidden="true"
        className="pointer-events-none absolute left-[3px] hidden text-on-ink peer-checked:block"
      >
        <path d="m1 5 3.5 3.5L11 1.5" fill="none" stroke="currentColor" strokeWidth="1.8" />
      </svg>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : ''}>
        {label}
      </label>
    </span>
  );
}
