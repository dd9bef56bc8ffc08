import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** The head of a screen: what it is, one line about it, what can be done. */
export function ScreenHead({
  title,
  about,
  actions,
  strip,
}: {
  title: ReactNode;
  about?: ReactNode;
  actions?: ReactNode;
  strip?: ReactNode;
}) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3 px-5 pt-6 pb-5 md:px-8 md:pt-9">
      <div className="flex min-w-0 items-end gap-4">
        {strip}
        <div className="min-w-0">
          <h1 className="text-head wrap-anywhere">{title}</h1>
          {about ? <div className="mt-1 max-w-[68ch] text-ink-soft">{about}</div> : null}
        </div>
      </div>
      {actions ? (
        <div className="flex flex-wrap gap-2" data-print="no">
          {actions}
        </div>
      ) : null}
    </header>
  );
}

/** One tile of the bench: a titled part of a screen. Lay several in an element of class `tiles`. */
export function Tile({
  title,
  actions,
  children,
  className,
  flush,
}: {
  title?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
  className?: string;
  flush?: boolean;
}) {
  return (
    <section className={classNames('min-w-0 bg-paper', className)}>
      {title || actions ? (
        <div className="flex min-h-12 flex-wrap items-center justify-between gap-2 px-5 pt-3 md:px-6">
          {title ? <h2 className="text-lead">{title}</h2> : <span />}
          {actions}
        </div>
      ) : null}
      <div className={flush ? '' : 'px-5 pt-2 pb-5 md:px-6 md:pb-6'}>{children}</div>
    </section>
  );
}

/** Words and their values: "Density 0.88 g/mL". */
export function Facts({ facts }: { facts: readonly { term: ReactNode; value: ReactNode }[] }) {
  return (
    <dl className="grid grid-cols-[minmax(8rem,auto)_1fr] gap-x-5">
      {facts.map(({ term, value }, index) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a list of facts keeps its order
        <div key={index} className="col-span-2 grid grid-cols-subgrid border-b border-grout py-1.5 last:border-0">
          <dt className="text-ink-soft">{term}</dt>
          <dd className="figures">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
