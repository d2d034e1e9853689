import type { QueryClient } from '@tanstack/react-query';
import { useParams, type LoaderFunction } from 'react-router-dom';
import { PolicyScreen, type PolicyPart } from '../../features/policies/components/policy-screen';
import { policyQueries } from '../../features/policies/queries';
import { NotFound } from '../not-found';

const parts: readonly PolicyPart[] = ['settings', 'versions', 'propose'];

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  () => {
    // Begun before the screen is there; the screen shows what becomes of it, a refusal too.
    void queryClient.query({ ...policyQueries.overview(), staleTime: 'static' }).catch(() => undefined);
    return null;
  };

export function Component() {
  const name = useParams().part;
  const part = parts.find((one) => one === name);
  if (part === undefined) return <NotFound sentence="There is no such part of the policy." />;
  return <PolicyScreen part={part} />;
}
