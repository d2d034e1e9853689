import {
  identifyResponseSchema,
  packResponseSchema,
  printLabelsResponseSchema,
  type IdentifyResponse,
  type PackRequest,
  type PrintLabelsRequest,
} from '#contract/packages';
import { paths } from '#contract/paths';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

/** Makes packages. The request id comes from the caller, who keeps it for every repeat. */
export function usePack() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: PackRequest) => api.post(paths.packages, request, packResponseSchema),
    // What is packed shows on lists, runs and the day alike.
    onSuccess: () => {
      void client.invalidateQueries();
    },
  });
}

export function usePrintLabels() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: PrintLabelsRequest) => api.post(paths.packageLabels, request, printLabelsResponseSchema),
    onSuccess: () => {
      void client.invalidateQueries();
    },
  });
}

/** What a scan at the packing station is. Changes nothing, so it may be asked as often as one likes. */
export function useIdentify() {
  return useMutation({
    mutationFn: (raw: string): Promise<IdentifyResponse> =>
      api.post(paths.packageIdentify, { raw }, identifyResponseSchema),
  });
}
