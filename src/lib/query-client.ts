import { QueryClient } from '@tanstack/react-query';

/** Server data lives here only. */
export const queryClient = new QueryClient({ defaultOptions: { queries: { retry: 1, refetchOnWindowFocus: false } } });
