import type { ReactNode } from 'react';
import { Button } from './button';
import { classNames } from './class-names';

/** A strip with nothing on it, climbing, or torn: what the three states of "no content" share. */
function PlainStrip({ state }: { state: 'empty' | 'climbing' | 'torn' }) {
  return (
    <svg width="26" height="104" viewBox="0 0 26 104" aria-hidden="true" className="flex-none">
      <path
        d="M1 13a12 12 0 0 1 24 0V103H1Z"
        fill="var(--paper)"
        stroke="var(--ink)"
        strokeDasharray={state === 'empty' ? '3 3' : undefined}
      />
      {state === 'climbing' ? (
        <path d="M1 13a12 12 0 0 1 24 0V86H1Z" className="animate-climb" fill="var(--grout)" />
      ) : null}
      {state === 'torn' ? (
        <path
          d="M-2 58 5 52l5 8 6-9 5 8 7-6v9l-7 6-5-8-6 9-5-8-7 6Z"
          fill="var(--paper)"
          stroke="var(--ink)"
          strokeLinejoin="round"
        />
      ) : null}
    </svg>
  );
}

function StateFrame({
  state,
  className,
  children,
}: {
  state: 'empty' | 'climbing' | 'torn';
  className?: string;
  children: ReactNode;
}) {
  return (
    <div className={classNames('flex items-center gap-6 px-5 py-10 md:px-10', className)}>
      <PlainStrip state={state} />
      <div className="grid max-w-prose justify-items-start gap-2">{children}</div>
    </div>
  );
}

/** Nothing here yet, and what to do about it. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <StateFrame state="empty">
      <p className="text-lead font-[560]">{title}</p>
      {children ? <div className="text-ink-soft">{children}</div> : null}
      {action ? <div className="pt-2">{action}</div> : null}
    </StateFrame>
  );
}

export interface ErrorStateProps {
  title?: string;
  /** What happened and what is safe, in a sentence. */
  children?: ReactNode;
  /** Only where doing it again is safe. */
  onRetry?: () => void;
  /** What to quote when asking for help. */
  reference?: string;
}

export function ErrorState({ title = 'This did not load', children, onRetry, reference }: ErrorStateProps) {
  return (
    <div role="alert">
      <StateFrame state="torn">
        <p className="text-lead font-[560]">{title}</p>
        <div className="text-ink-soft">{children ?? 'What you entered before is kept.'}</div>
        {onRetry ? (
          <Button look="solid" className="mt-2" onClick={onRetry}>
            Try again
          </Button>
        ) : null}
        {reference ? <p className="figures text-note text-ink-soft">Reference {reference}</p> : null}
      </StateFrame>
    </div>
  );
}

/** While a page or a panel is on its way. */
export function LoadingState({ children = 'Loading' }: { children?: ReactNode }) {
  return (
    <div role="status">
      <StateFrame state="climbing">
        <p className="text-ink-soft">{children}</p>
      </StateFrame>
    </div>
  );
}

/** A line of text that has not come yet. `width` in CSS, e.g. "12ch". */
export function Skeleton({ width = '100%', className }: { width?: string; className?: string }) {
  return (
    <span
      aria-hidden="true"
      className={classNames('hatch inline-block h-[0.8em] rounded-tile opacity-60', className)}
      style={{ width }}
    />
  );
}

/** Rows of a table that has not come yet, each with its empty strip. */
export function SkeletonRows({ rows = 8, label = 'Loading the list' }: { rows?: number; label?: string }) {
  return (
    <div role="status" aria-label={label} className="divide-y divide-grout">
      {Array.from({ length: rows }, (_, row) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: rows without content have nothing else to be known by
        <div key={row} className="flex h-14 items-center gap-4 px-5">
          <span className="h-10 w-[11px] flex-none rounded-t-strip rounded-b-tile border border-grout" />
          <Skeleton width={`${14 + ((row * 7) % 11)}ch`} />
          <Skeleton width="8ch" className="ml-auto" />
        </div>
      ))}
    </div>
  );
}
