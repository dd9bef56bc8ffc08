'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { classNames } from '../ui/class-names';
import { Drawing, ENTRIES } from './entries';

/** The links that this member may follow. Knows only hrefs from the server; the drawings come with the script. */
function useEntries(allowed: readonly string[]) {
  const path = usePathname();
  return ENTRIES.filter(({ href }) => allowed.includes(href)).map((entry) => ({
    ...entry,
    here: path === entry.href || path.startsWith(`${entry.href}/`),
  }));
}

export function RailLinks({ allowed }: { allowed: readonly string[] }) {
  return (
    <ul className="grid">
      {useEntries(allowed).map(({ href, name, drawing, here }) => (
        <li key={href}>
          <Link
            href={href}
            aria-current={here ? 'page' : undefined}
            className={classNames(
              'relative flex min-h-10 items-center gap-3 pr-4 pl-6 text-body',
              here ? 'font-[600]' : 'text-ink-soft hover:bg-wash hover:text-ink',
            )}
          >
            {here ? (
              <span aria-hidden="true" className="absolute inset-y-1.5 left-0 w-1.5 rounded-r-strip bg-ink" />
            ) : null}
            <Drawing>{drawing}</Drawing>
            {name}
          </Link>
        </li>
      ))}
    </ul>
  );
}

export function BarLinks({ allowed }: { allowed: readonly string[] }) {
  return (
    <>
      {useEntries(allowed).map(({ href, name, drawing, here }) => (
        <Link
          key={href}
          href={href}
          aria-current={here ? 'page' : undefined}
          className={classNames(
            'relative grid min-h-14 flex-1 place-content-center justify-items-center gap-0.5 text-note',
            here ? 'font-[650]' : 'text-ink-soft',
          )}
        >
          {here ? <span aria-hidden="true" className="absolute inset-x-5 top-0 h-1 rounded-b-strip bg-ink" /> : null}
          <Drawing>{drawing}</Drawing>
          {name}
        </Link>
      ))}
    </>
  );
}
