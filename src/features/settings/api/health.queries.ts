import { queryOptions, useQuery } from '@tanstack/react-query';
import { healthResponse } from '#shared/api/health.ts';
import { getJson } from '#src/lib/api-client.ts';

const healthQuery = queryOptions({
  queryKey: ['health'],
  queryFn: () => getJson('api/health', healthResponse, [200, 503]),
  staleTime: 0,
});

/** Whether the server and its database answer. */
export function useHealth() {
  return useQuery(healthQuery);
}
