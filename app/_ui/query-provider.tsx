'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';

/** One cache of answers for the page. A failed question is asked once more; a page that comes back to the front asks again. */
export function QueryProvider({ children }: { readonly children: ReactNode }) {
  const [client] = useState(() => new QueryClient({ defaultOptions: { queries: { retry: 1, staleTime: 5_000 } } }));
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
