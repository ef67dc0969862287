import { QueryClientProvider } from '@tanstack/react-query';
import { type ReactNode, useRef, useState } from 'react';
import { FocusedAddress } from '../components/ui/page-title.tsx';
import { createQueryClient } from '../lib/query-client.ts';

export function Providers({ children }: { children: ReactNode }) {
  const [client] = useState(createQueryClient);
  const firstAddress = useRef({ address: window.location.pathname, moved: false });
  return (
    <QueryClientProvider client={client}>
      <FocusedAddress value={firstAddress}>{children}</FocusedAddress>
    </QueryClientProvider>
  );
}
