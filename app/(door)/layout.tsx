import Link from 'next/link';
import type { ReactNode } from 'react';
import { Wordmark } from '../_components/brand/wordmark';
import { StripRow } from '../_sample/strip-row';

/** The door: a paper label on the tiled bench, and strips that stand beside it. */
export default function DoorLayout({ children }: { children: ReactNode }) {
  return (
    <div className="bench-tiles grid min-h-dvh lg:grid-cols-[minmax(0,34rem)_minmax(0,1fr)]">
      <main className="grid content-start p-4 sm:p-8 lg:p-12">
        <div className="label-plate w-full max-w-[34rem] px-6 py-8 sm:px-10 sm:py-10">
          <Link href="/" aria-label="Stillroom, first page" className="mb-10 inline-block">
            <Wordmark height={24} />
          </Link>
          <div className="grid gap-6">{children}</div>
        </div>
      </main>
      <div aria-hidden="true" className="hidden overflow-hidden lg:block">
        <div className="sticky top-0 flex h-dvh items-end pl-4">
          <StripRow />
        </div>
      </div>
    </div>
  );
}
