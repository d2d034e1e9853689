import { paths } from '#contract/paths';
import {
  addRunRequestSchema,
  addRunResponseSchema,
  changeRunResponseSchema,
  dropRunResponseSchema,
  removePackagesResponseSchema,
  stagePackagesResponseSchema,
  stagingScanResponseSchema,
  type AddRunRequest,
  type ChangeRunRequest,
} from '#contract/runs';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';
import { isProblem, NoLineError } from '../../lib/errors';

/** A run shows on the board, in lists of packages, in the day and where loads are opened: all look again. */
function useLookAgain() {
  const client = useQueryClient();
  return () => client.invalidateQueries();
}

export function useAddRun() {
  const lookAgain = useLookAgain();
  return useMutation({
    mutationFn: (request: AddRunRequest) =>
      api.post(paths.runs, addRunRequestSchema.parse(request), addRunResponseSchema),
    onSuccess: lookAgain,
  });
}

export function useChangeRun(runId: string) {
  const lookAgain = useLookAgain();
  return useMutation({
    mutationFn: (request: ChangeRunRequest) => api.patch(paths.run(runId), request, changeRunResponseSchema),
    onSuccess: lookAgain,
    onError: (error) => {
      // The screen behind shows what there is to look at again.
      if (isProblem(error)) void lookAgain();
    },
  });
}

type OfRun = { readonly runId: string; readonly requestId: string };
type WithPackages = OfRun & { readonly packageIds: readonly string[] };

export function useStagePackages() {
  const lookAgain = useLookAgain();
  return useMutation({
    mutationFn: ({ runId, ...request }: WithPackages) =>
      api.post(`${paths.run(runId)}/packages`, request, stagePackagesResponseSchema),
    onSuccess: lookAgain,
  });
}

export function useRemovePackages() {
  const lookAgain = useLookAgain();
  return useMutation({
    mutationFn: ({ runId, ...request }: WithPackages) =>
      api.post(`${paths.run(runId)}/remove`, request, removePackagesResponseSchema),
    onSuccess: lookAgain,
  });
}

export function useDropRun() {
  const lookAgain = useLookAgain();
  return useMutation({
    mutationFn: ({ runId, requestId }: OfRun) =>
      api.post(`${paths.run(runId)}/drop`, { requestId }, dropRunResponseSchema),
    onSuccess: lookAgain,
  });
}

const tries = 3;

/** Scans go one after the other, in the order they were made. Silence is worth another try: the request id stays. */
export function useScanIntoRun(runId: string) {
  const lookAgain = useLookAgain();
  return useMutation({
    scope: { id: `run-${runId}` },
    retry: (failures, error) => error instanceof NoLineError && failures < tries,
    retryDelay: 600,
    mutationFn: ({ requestId, raw }: { readonly requestId: string; readonly raw: string }) =>
      api.post(`${paths.run(runId)}/scan`, { requestId, raw }, stagingScanResponseSchema),
    // Not waited for: the next scan must not wait for a list.
    onSuccess: () => {
      void lookAgain();
    },
  });
}
