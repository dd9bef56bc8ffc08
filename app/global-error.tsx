'use client';

import './globals.css';
import { ErrorState } from './_components/ui/states';

/** When even the frame of the page failed: no fonts, no providers, only words and a way on. */
export default function GlobalError({ error, retry }: { error: Error & { digest?: string }; retry: () => void }) {
  return (
    <html lang="en-GB">
      <body>
        <title>Stillroom</title>
        <main>
          <ErrorState title="Stillroom did not load" onRetry={retry} reference={error.digest}>
            What you saved before is kept.
          </ErrorState>
        </main>
      </body>
    </html>
  );
}
