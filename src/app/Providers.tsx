import { QueryClientProvider } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { MessagesProvider } from '../ui/MessagesProvider.tsx';
import { createQueryClient } from './query-client.ts';

export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(createQueryClient);
  return (
    <QueryClientProvider client={client}>
      <MessagesProvider>{children}</MessagesProvider>
    </QueryClientProvider>
  );
}
