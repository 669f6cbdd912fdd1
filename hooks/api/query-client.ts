import { QueryClient } from '@tanstack/react-query';
import { isPassing } from './api-error';

/** How long an answer of the server is taken as fresh, ms: moving between screens in that time asks nothing again. */
const FRESH = 15_000;

/** One for each person and company: what one of them read is never shown to the next. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        // `navigator.onLine` is true on a site network that leads nowhere, so the request itself decides, and says so by failing.
        networkMode: 'always',
        refetchOnReconnect: true,
        staleTime: FRESH,
        // A refusal will be refused again; a fault or a dead second deserves one more try.
        retry: (failures, error) => failures < 1 && isPassing(error),
      },
      // Nothing is sent twice unless the person says so: what must survive a dead spot goes through the outbox.
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
