import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { useState, type ReactNode } from 'react';
import { Refusal } from './api';

function retry(failures: number, error: Error): boolean {
  return failures < 2 && !(error instanceof Refusal && error.status >= 400 && error.status < 500);
}

/** Stands around every island: one language for figures on server and client, and one query client. */
export function Island({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: { queries: { retry, staleTime: 10_000 }, mutations: { retry: false } },
      }),
  );
  return (
    <I18nProvider locale="en-GB">
      <QueryClientProvider client={client}>{children}</QueryClientProvider>
    </I18nProvider>
  );
}
