import { QueryClientProvider } from '@tanstack/react-query';
import { Slot } from 'expo-router';
import { useState } from 'react';
import { ToastProvider } from '@/components/ui/toast';
import { useBrierbookFonts } from '@/components/ui/theme/fonts';
import { createQueryClient } from '@/hooks/client/query-client';
import '@/hooks/client/zod-setup';

export default function RootLayout() {
  const [queryClient] = useState(createQueryClient);
  useBrierbookFonts();
  return (
    <QueryClientProvider client={queryClient}>
      <ToastProvider>
        <Slot />
      </ToastProvider>
    </QueryClientProvider>
  );
}
