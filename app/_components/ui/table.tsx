import Link from 'next/link';
import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';

/**
 * Ruled like a ledger: hairlines between rows, ink under the heads, figures in columns. Scrolls sideways within itself;
 * `relative` keeps words for screen readers alone, which are placed absolutely, from widening the page.
 */
export function Table({ label, className, children, ...rest }: ComponentProps<'table'> & { label: string }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be scrollable by keys
    <section aria-label={label} tabIndex={0} className="relative overflow-x-auto focus-visible:outline-offset-[-2px]">
      <table className={classNames('w-full border-collapse text-left', className)} {...rest}>
        {children}
      </table>
    </section>
  );
}

const edge = 'px-3 first:pl-5 last:pr-5';

/** A column head. Give `sort` a link and the present direction to make it sortable; numbers stand right. */
export function Th({
  numeric,
  sort,
  className,
  children,
  ...rest
}: ComponentProps<'th'> & {
  numeric?: boolean;
  sort?: { href: string; direction: 'ascending' | 'descending' | null };
}) {
  return (
    <th
      scope="col"
      aria-sort={sort?.direction ?? undefined}
      className={classNames(
        'narrow h-9 border-b border-ink font-[560] whitespace-nowrap text-ink-soft',
        edge,
        numeric && 'text-right',
        className,
      )}
      {...rest}
    >
      {sort ? (
        <Link href={sort.href} className="inline-flex min-h-8 items-center gap-1 hover:text-ink" scroll={false}>
          {children}
          <SortArrow direction={sort.direction} />
        </Link>
      ) : (
        children
      )}
    </th>
  );
}

/** For heads that sort in place: put it after the words within your own button. */
export function SortArrow({ direction }: { direction: 'ascending' | 'descending' | null }) {
  return (
    <svg viewBox="0 0 8 10" width="8" height="10" aria-hidden="true" className={direction ? '' : 'opacity-0'}>
      <path
        d={direction === 'descending' ? 'M4 1v8M1 6l3 3 3-3' : 'M4 9V1M1 4l3-3 3 3'}
        fill="none"
        stroke="currentColor"
        strokeWidth="1.3"
      />
    </svg>
  );
}

export function Td({ numeric, className, ...rest }: ComponentProps<'td'> & { numeric?: boolean }) {
  return (
    <td
      className={classNames(
        'h-12 border-b border-grout py-1.5',
        edge,
        numeric && 'figures text-right whitespace-nowrap',
        className,
      )}
      {...rest}
    />
  );
}

export interface PagerProps {
  /** "1-50 of 212 materials". */
  words: ReactNode;
  previous?: string | null;
  next?: string | null;
}

export function Pager({ words, previous, next }: PagerProps) {
  return (
    <nav aria-label="Pages" className="flex items-center justify-between gap-4 px-5 py-3" data-print="no">
      <span className="figures text-ink-soft">{words}</span>
      <span className="flex gap-2">
        <PagerLink href={previous}>Previous</PagerLink>
        <PagerLink href={next}>Next</PagerLink>
      </span>
    </nav>
  );
}

function PagerLink({ href, children }: { href?: string | null; children: ReactNode }) {
  const look = 'inline-grid min-h-8 place-items-center rounded-tile border px-3';
  return href ? (
    <Link href={href} className={classNames(look, 'border-rule hover:border-ink hover:bg-wash')}>
      {children}
    </Link>
  ) : (
    <span aria-disabled="true" className={classNames(look, 'border-grout text-ink-faint')}>
      {children}
    </span>
  );
}
