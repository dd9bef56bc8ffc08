'use client';

import { ErrorState } from '../_components/ui/states';

/** A screen that failed, with the shell still around it. The cause stays on the server; the digest finds it there. */
export default function ScreenError({ error, retry }: { error: Error & { digest?: string }; retry: () => void }) {
  return (
    <ErrorState title="This screen did not load" onRetry={retry} reference={error.digest}>
      What you saved before is kept. Try again; if it fails again, quote the reference below.
    </ErrorState>
  );
}
