import { paths } from '#contract/paths';
import {
  confirmPolicyChangeResponseSchema,
  policyProposalResponseSchema,
  type ProposePolicyChangeRequest,
  type TurnDownPolicyChangeRequest,
} from '#contract/policies';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, noContentSchema } from '../../lib/api-client';
import { isProblem } from '../../lib/errors';
import { policyQueries } from './queries';

/** Settled or proposed, the screen looks again; also where somebody else was first, so that it shows what happened. */
function usePolicyChanged() {
  const client = useQueryClient();
  const look = () => client.invalidateQueries({ queryKey: policyQueries.all() });
  return {
    onSuccess: look,
    onError: (error: Error) => {
      if (isProblem(error) && error.httpStatus === 409) void look();
    },
  };
}

export function useProposeChange() {
  return useMutation({
    mutationFn: (request: ProposePolicyChangeRequest) =>
      api.post(paths.policyProposals, request, policyProposalResponseSchema),
    ...usePolicyChanged(),
  });
}

export function useConfirmChange(proposalId: string) {
  return useMutation({
    mutationFn: (requestId: string) =>
      api.post(`${paths.policyProposal(proposalId)}/confirm`, { requestId }, confirmPolicyChangeResponseSchema),
    ...usePolicyChanged(),
  });
}

export function useTurnDownChange(proposalId: string, act: 'withdraw' | 'refuse') {
  return useMutation({
    mutationFn: (request: TurnDownPolicyChangeRequest) =>
      api.post(`${paths.policyProposal(proposalId)}/${act}`, request, noContentSchema),
    ...usePolicyChanged(),
  });
}
