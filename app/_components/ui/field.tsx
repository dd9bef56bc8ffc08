import { type ComponentProps, type ReactNode, useId } from 'react';
import { classNames } from './class-names';

export interface FieldWords {
  label: ReactNode;
  /** What to put here, before anything is wrong. */
  hint?: ReactNode;
  /** The sentence that names the field and the reason. */
  error?: ReactNode;
}

export const inputClasses =
  'w-full min-h-10 rounded-tile border border-rule bg-paper px-3 text-body text-ink md:text-data ' +
  'hover:border-ink focus:border-ink aria-invalid:border-ink aria-invalid:border-2 disabled:opacity-50 figures';

/** Label above, control, then the error or the hint. `children` gets the ids that tie them together. */
export function FieldFrame(props: FieldWords & { id: string; className?: string; children: ReactNode }) {
  const { id, label, hint, error, className, children } = props;
  return (
    <div className={classNames('grid gap-1.5', className)}>
      <label htmlFor={id} className="font-[560]">
        {label}
      </label>
      {children}
      <FieldNote id={`${id}-note`} hint={hint} error={error} />
    </div>
  );
}

export function FieldNote({ id, hint, error }: { id: string; hint?: ReactNode; error?: ReactNode }) {
  if (error)
    return (
      <p id={id} className="flex gap-1.5 font-[560]">
        <span
          aria-hidden="true"
          className="mt-px inline-grid size-4 flex-none place-items-center rounded-strip bg-ink text-note text-on-ink"
        >
          !
        </span>
        {error}
      </p>
    );
  return hint ? (
    <p id={id} className="text-ink-soft">
      {hint}
    </p>
  ) : null;
}

type InputProps = Omit<ComponentProps<'input'>, 'id'> & FieldWords & { unit?: ReactNode };

/** One line of text. Plain HTML: forms work before any script has come. */
export function TextField({ label, hint, error, unit, className, ...rest }: InputProps) {
  const id = useId();
  const note = error || hint ? `${id}-note` : undefined;
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <span className="relative block">
        <input
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={note}
          className={classNames(inputClasses, unit ? 'pr-14' : '')}
          {...rest}
        />
        {unit ? (
          <span className="pointer-events-none absolute inset-y-0 right-3 grid place-items-center text-ink-soft">
            {unit}
          </span>
        ) : null}
      </span>
    </FieldFrame>
  );
}

type AreaProps = Omit<ComponentProps<'textarea'>, 'id'> & FieldWords;

export function TextArea({ label, hint, error, className, ...rest }: AreaProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <textarea
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={error || hint ? `${id}-note` : undefined}
        className={classNames(inputClasses, 'min-h-24 py-2')}
        {...rest}
      />
    </FieldFrame>
  );
}

type SelectProps = Omit<ComponentProps<'select'>, 'id'> &
  FieldWords & { options: readonly { value: string; label: string; disabled?: boolean }[] };

/** The system's own list: the best there is on a phone, and no script. */
export function Select({ label, hint, error, options, className, ...rest }: SelectProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <span className="relative block">
        <select
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={error || hint ? `${id}-note` : undefined}
          className={classNames(inputClasses, 'appearance-none pr-9')}
          {...rest}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
        <svg
          viewBox="0 0 10 6"
          width="10"
          height="6"
          aria-hidden="true"
          className="pointer-events-none absolute top-1/2 right-3 -translate-y-1/2"
        >
          <path d="m1 1 4 4 4-4" fill="none" stroke="currentColor" strokeWidth="1.4" />
        </svg>
      </span>
    </FieldFrame>
  );
}
