import { recordAirRemovalTestResponseSchema, type RecordAirRemovalTestRequest } from '#contract/air-removal-tests';
import { paths } from '#contract/paths';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

/** A test changes what may be loaded: every screen that shows it is asked for again. */
export function useRecordAirRemovalTest() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (request: RecordAirRemovalTestRequest) =>
      api.post(paths.airRemovalTests, request, recordAirRemovalTestResponseSchema),
    onSuccess: () => queryClient.invalidateQueries(),
  });
}
