import { QueryClientProvider } from '@tanstack/react-query';
import { useEffect, type ReactNode } from 'react';
import { I18nProvider } from 'react-aria-components';
import { AnnouncerProvider } from '../components/ui/announcer';
import { watchActivity } from '../lib/activity';
import { ScannerContext } from '../lib/scanner-input';
import { SoundsContext } from '../lib/sounds';
import type { Services } from './services';

export function Providers({ services, children }: { services: Services; children: ReactNode }) {
  const { queryClient, scanner, sounds } = services;
  useEffect(() => scanner.attach(window), [scanner]);
  useEffect(() => watchActivity(window), []);
  return (
    <QueryClientProvider client={queryClient}>
      <I18nProvider locale="en-GB">
        <ScannerContext value={scanner}>
          <SoundsContext value={sounds}>
            <AnnouncerProvider>{children}</AnnouncerProvider>
          </SoundsContext>
        </ScannerContext>
      </I18nProvider>
    </QueryClientProvider>
  );
}
