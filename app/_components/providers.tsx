'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { ThemeProvider } from 'next-themes';
import { NuqsAdapter } from 'nuqs/adapters/next/app';
import { type ReactNode, useState } from 'react';
import { Announcements } from './ui/toast';

/** What every screen stands in: theme, server state, URL state, and the live region that speaks for them all. */
export function Providers({ nonce, children }: { nonce?: string; children: ReactNode }) {
  const [queryClient] = useState(
    () =>
      new QueryClient({ defaultOptions: { queries: { staleTime: 30_000, retry: 1, refetchOnWindowFocus: false } } }),
  );
  return (
    <ThemeProvider attribute="data-theme" enableColorScheme={false} disableTransitionOnChange nonce={nonce}>
      <QueryClientProvider client={queryClient}>
        <NuqsAdapter>
          {children}
          <Announcements />
        </NuqsAdapter>
      </QueryClientProvider>
    </ThemeProvider>
  );
}
