import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** How a thing stands. Told apart by shape, weight and word; there is no red and no green here. */
export type MarkState = 'met' | 'exceeded' | 'unknown' | 'stale' | 'saved' | 'draft';

const WORDS: Record<MarkState, string> = {
  met: 'met',
  exceeded: 'exceeded',
  unknown: 'unknown',
  stale: 'out of date',
  saved: 'saved',
  draft: 'not saved',
};

const FRAMES: Record<MarkState, string> = {
  met: 'border-rule bg-paper',
  exceeded: 'border-ink bg-ink text-on-ink font-[650]',
  unknown: 'border-dashed border-ink bg-paper italic',
  stale: 'border-rule hatch [&>span]:bg-paper [&>span]:px-1 px-0.5',
  saved: 'border-transparent',
  draft: 'border-transparent font-[560]',
};

const SHAPES: Record<MarkState, ReactNode> = {
  met: <path d="m1.5 5.5 3 3 6-7" fill="none" strokeWidth="1.7" />,
  exceeded: <path d="M6 1 11.5 10.5H.5Z" fill="currentColor" stroke="none" />,
  unknown: <path d="M3 4a3 3 0 1 1 4.2 2.7C6.3 7.1 6 7.5 6 8.2M6 10v1" fill="none" strokeWidth="1.5" />,
  stale: <path d="M6 3v3.2l2.2 1.6M6 1a5 5 0 1 1-.01 0Z" fill="none" strokeWidth="1.2" />,
  saved: <circle cx="6" cy="6" r="3" fill="currentColor" stroke="none" />,
  draft: <circle cx="6" cy="6" r="3.2" fill="none" strokeWidth="1.6" />,
};

/** `<Mark state="exceeded">by 0.4 %</Mark>` reads "exceeded by 0.4 %". */
export function Mark({ state, children, className }: { state: MarkState; children?: ReactNode; className?: string }) {
  return (
    <span
      className={classNames(
        'inline-flex min-h-6 items-center gap-1.5 rounded-tile border px-1.5 align-middle whitespace-nowrap',
        FRAMES[state],
        className,
      )}
    >
      <span className="inline-flex items-center gap-1.5">
        <svg viewBox="0 0 12 12" width="12" height="12" stroke="currentColor" aria-hidden="true" className="flex-none">
          {SHAPES[state]}
        </svg>
        <span>
          {WORDS[state]}
          {children ? <> {children}</> : null}
        </span>
      </span>
    </span>
  );
}

/** A word on a small paper label: a kind, a filter in force. `onRemove` gives it a button. */
export function Tag({
  children,
  onRemove,
  removeLabel,
}: {
  children: ReactNode;
  onRemove?: () => void;
  removeLabel?: string;
}) {
  return (
    <span className="inline-flex min-h-6 items-center gap-1 rounded-tile border border-rule bg-paper px-2 text-note">
      {children}
      {onRemove ? (
        <button
          type="button"
          onClick={onRemove}
          aria-label={removeLabel ?? 'Remove'}
          className="-mr-1.5 grid size-6 place-items-center hover:bg-wash"
        >
          <svg viewBox="0 0 12 12" width="8" height="8" aria-hidden="true">
            <path d="m1 1 10 10M11 1 1 11" stroke="currentColor" strokeWidth="1.8" />
          </svg>
        </button>
      ) : null}
    </span>
  );
}
