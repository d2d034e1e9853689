import type { QueryClient } from '@tanstack/react-query';
import { createQueryClient } from '../lib/query-client';
import { createScannerHub, type ScannerHub } from '../lib/scanner-input';
import { createSounds, type Sounds } from '../lib/sounds';

/** What lives as long as the page does, made once and handed down. */
export type Services = {
  readonly queryClient: QueryClient;
  readonly scanner: ScannerHub;
  readonly sounds: Sounds;
};

export function createServices(): Services {
  return { queryClient: createQueryClient(), scanner: createScannerHub(), sounds: createSounds() };
}
