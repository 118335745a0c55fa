'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useState } from 'react';
import { LocaleProvider } from '@/components/ui/locale';
import { ApiFailure } from '@/lib/queries/api';
import type { Locale } from '@/lib/text/locale';

const MAX_RETRIES = 2;

/** An answer that says no will say no again; only a lost connection or a broken server is retried. */
function worthRetrying(failures: number, error: Error): boolean {
  if (failures >= MAX_RETRIES) return false;
  return !(error instanceof ApiFailure) || error.status === 0 || error.status >= 500;
}

function makeQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { staleTime: 10_000, retry: worthRetrying },
      mutations: { retry: false },
    },
  });
}

export function Providers({ locale, children }: { locale: Locale; children: ReactNode }) {
  const [client] = useState(makeQueryClient);
  return (
    <QueryClientProvider client={client}>
      <LocaleProvider locale={locale}>{children}</LocaleProvider>
    </QueryClientProvider>
  );
}
