'use client';

import { ErrorState } from './_components/ui/states';

export default function PageError({ error, retry }: { error: Error & { digest?: string }; retry: () => void }) {
  return (
    <main className="bench-tiles grid min-h-dvh place-items-center p-4">
      <div className="label-plate w-full max-w-xl">
        <ErrorState title="This page did not load" onRetry={retry} reference={error.digest}>
          What you saved before is kept.
        </ErrorState>
      </div>
    </main>
  );
}
