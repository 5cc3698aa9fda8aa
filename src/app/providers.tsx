import { type QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { StatusProvider } from '../ui/status';

/** What every page may use: the server's answers and the place for messages. */
export function Providers({ client, children }: { readonly client: QueryClient; readonly children: ReactNode }) {
  return (
    <QueryClientProvider client={client}>
      <StatusProvider>{children}</StatusProvider>
    </QueryClientProvider>
  );
}
