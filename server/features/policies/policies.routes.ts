import { idSchema } from '#contract/common';
import { paths } from '#contract/paths';
import {
  confirmPolicyChangeRequestSchema,
  confirmPolicyChangeResponseSchema,
  policyOverviewSchema,
  policyProposalResponseSchema,
  proposePolicyChangeRequestSchema,
  turnDownPolicyChangeRequestSchema,
} from '#contract/policies';
import { z } from 'zod';
import { defineRoute, type Route } from '../../http/define-route';
import { getPolicyOverview } from './policy-overview-read-model';
import { proposeChange } from './propose-change';
import { confirmChange, turnDownChange } from './settle-change';

const proposalParams = z.object({ proposalId: idSchema });
const one = paths.policyProposal(':proposalId');

export const policyRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.policies,
    permission: 'policy.view',
    response: policyOverviewSchema,
    handle: ({ services, actor }) => getPolicyOverview(services.db, actor.facilityId, services.clock.now()),
  }),
  defineRoute({
    method: 'post',
    path: paths.policyProposals,
    permission: 'policy.propose',
    body: proposePolicyChangeRequestSchema,
    response: policyProposalResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => proposeChange(services, actor, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/confirm`,
    permission: 'policy.confirm',
    params: proposalParams,
    body: confirmPolicyChangeRequestSchema,
    response: confirmPolicyChangeResponseSchema,
    handle: ({ services, actor, params, body }) => confirmChange(services, actor, params.proposalId, body.requestId),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/withdraw`,
    permission: 'policy.propose',
    params: proposalParams,
    body: turnDownPolicyChangeRequestSchema,
    response: 'nothing',
    handle: ({ services, actor, params, body }) =>
      turnDownChange(services, actor, { ...params, ...body, act: 'withdraw' }),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/refuse`,
    permission: 'policy.confirm',
    params: proposalParams,
    body: turnDownPolicyChangeRequestSchema,
    response: 'nothing',
    handle: ({ services, actor, params, body }) =>
      turnDownChange(services, actor, { ...params, ...body, act: 'refuse' }),
  }),
];
