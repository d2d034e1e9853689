import {
  closeLoadResponseSchema,
  loadChangeResponseSchema,
  openLoadResponseSchema,
  printStickersResponseSchema,
  scanResponseSchema,
  type LoadChange,
  type OpenLoadRequest,
  type ScanPlace,
  type ScanResponse,
} from '#contract/loads';
import { paths } from '#contract/paths';
import type { LoadEdit } from '#domain/load/finding';
import { useMutation, useQueryClient, type MutationOptions, type QueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import { api, noContentSchema } from '../../lib/api-client';
import { NoLineError } from '../../lib/errors';
import { newRequestId } from '../../lib/request-id';
import type { ScanEntry } from '../../lib/scanner-input';
import { applyChange } from './apply-change';
import { loadQueries } from './queries';

const longestWaitMs = 4_000;

/** Acts on one load go one after the other, in the order they were made: no scan overtakes another. */
function inOrder(loadId: string) {
  return { scope: { id: `load-${loadId}` } };
}

async function takeIn(client: QueryClient, loadId: string, change: LoadChange | null): Promise<void> {
  if (change === null) return;
  const { queryKey } = loadQueries.detail(loadId);
  // An answer that is still under way knows less than this change.
  await client.cancelQueries({ queryKey });
  const held = client.getQueryData(queryKey);
  const next = held && applyChange(held, change);
  if (next) client.setQueryData(queryKey, next);
  else await client.invalidateQueries({ queryKey });
}

export function useOpenLoad() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: Omit<OpenLoadRequest, 'requestId'>) =>
      api.post(paths.loads, { requestId: newRequestId(), ...request }, openLoadResponseSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: loadQueries.all() }),
  });
}

export type ScanToSend = {
  /** Made when the scanner beeped, and kept for every repeat: a scan that was answered too late is not taken twice. */
  readonly requestId: string;
  readonly raw: string;
  readonly entry: ScanEntry;
  readonly place: ScanPlace | null;
};

/** Sends scans. Its caller shows what comes of each, so no screen watches the mutation itself and is drawn for its sake. */
export function useScanIntoLoad(loadId: string): (scan: ScanToSend) => Promise<ScanResponse> {
  const client = useQueryClient();
  return useCallback(
    (scan) => {
      const options: MutationOptions<ScanResponse, Error, ScanToSend> = {
        ...inOrder(loadId),
        // Silence is no answer: the scan stays here and is sent again until the line is back. Those after it wait their turn.
        retry: (_failures, error) => error instanceof NoLineError,
        retryDelay: (failures) => Math.min(500 * 2 ** failures, longestWaitMs),
        mutationFn: (sent) => api.post(`${paths.load(loadId)}/scans`, sent, scanResponseSchema),
        onSuccess: (reply) => takeIn(client, loadId, reply.change),
      };
      return client.getMutationCache().build(client, client.defaultMutationOptions(options)).execute(scan);
    },
    [client, loadId],
  );
}

export function useEditLoad(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (edits: readonly LoadEdit[]) =>
      api.post(`${paths.load(loadId)}/edits`, { requestId: newRequestId(), edits }, loadChangeResponseSchema),
    onSuccess: ({ change }) => takeIn(client, loadId, change),
  });
}

export function useUndoLastAct(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (undoing: string) =>
      api.post(`${paths.load(loadId)}/undo`, { requestId: newRequestId(), undoing }, loadChangeResponseSchema),
    onSuccess: ({ change }) => takeIn(client, loadId, change),
  });
}

export function useCountShelf(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (count: { readonly shelfId: string; readonly counted: number }) =>
      api.post(`${paths.load(loadId)}/counts`, { requestId: newRequestId(), ...count }, loadChangeResponseSchema),
    onSuccess: ({ change }) => takeIn(client, loadId, change),
  });
}

export function useAcceptFinding(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (acceptance: { readonly findingKey: string; readonly reason: string }) =>
      api.post(
        `${paths.load(loadId)}/acceptances`,
        { requestId: newRequestId(), ...acceptance },
        loadChangeResponseSchema,
      ),
    onSuccess: ({ change }) => takeIn(client, loadId, change),
  });
}

/** No optimism here: the screen waits for the server to say that the load is closed. */
export function useCloseLoad(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: () => api.post(`${paths.load(loadId)}/close`, { requestId: newRequestId() }, closeLoadResponseSchema),
    onSettled: () => client.invalidateQueries({ queryKey: loadQueries.all() }),
  });
}

export function useAbandonLoad(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (reason: string) =>
      api.post(`${paths.load(loadId)}/abandon`, { requestId: newRequestId(), reason }, noContentSchema),
    onSettled: () => client.invalidateQueries({ queryKey: loadQueries.all() }),
  });
}

export function usePrintStickers(loadId: string) {
  const client = useQueryClient();
  return useMutation({
    ...inOrder(loadId),
    mutationFn: (request: { readonly packageIds: readonly string[] | null; readonly reason: string | null }) =>
      api.post(
        `${paths.load(loadId)}/stickers`,
        { requestId: newRequestId(), ...request },
        printStickersResponseSchema,
      ),
    onSuccess: () => client.invalidateQueries({ queryKey: loadQueries.detail(loadId).queryKey }),
  });
}
