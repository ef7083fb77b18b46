import { QueryClient } from '@tanstack/react-query';
import { ProblemError } from './problem-error';

/** All server state of the dashboard. A no of the API is final; only a service that was not reached is asked again. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: {
      staleTime: 15_000,
      retry: (failures, error) => !(error instanceof ProblemError && error.status < 500) && failures < 1,
      retryDelay: 800,
    },
  },
});
