'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { type ReactElement, type ReactNode, useState } from 'react';

/** Gives the lab pages one query client; a change of a reading is never sent twice by itself. */
export function QueryProvider({ children }: { children: ReactNode }): ReactElement {
  const [client] = useState(() => new QueryClient({ defaultOptions: { mutations: { retry: false } } }));
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
