'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { NuqsAdapter } from 'nuqs/adapters/next/app';
import { useState, type ReactNode } from 'react';
import type { RequestError } from '@/lib/client/request';
import { Toaster } from '@/components/ui/toaster';

/** What every page stands in: the cache of answers, the state in the address, short messages. */
export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: {
            staleTime: 15_000,
            // A refusal stays a refusal; only an unreachable server or its fault is worth another try.
            retry: (count, error) =>
              count < 2 &&
              [0, 500, 502, 503].includes((error as unknown as RequestError).problem?.status ?? 0),
          },
        },
      }),
  );
  return (
    <QueryClientProvider client={client}>
      <NuqsAdapter>{children}</NuqsAdapter>
      <Toaster />
    </QueryClientProvider>
  );
}
