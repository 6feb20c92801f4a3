import { QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { queryClient } from '#src/lib/query-client.ts';

/** Around everything that asks the server. The guest's bench asks nothing, so that its first view does not load this. */
export function ServerData({ children }: { readonly children: ReactNode }) {
  return <QueryClientProvider client={queryClient}>{children}</QueryClientProvider>;
}
