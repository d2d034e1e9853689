import { paths } from '#contract/paths';
import {
  addPersonResponseSchema,
  oneTimePasswordResponseSchema,
  personResponseSchema,
  pinResponseSchema,
  type AddPersonRequest,
  type ChangePersonRequest,
  type JoinPersonRequest,
} from '#contract/people';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';
import { isProblem } from '../../lib/errors';

/** Once a person was changed, every screen that names them is asked for again; the change counts as done only then. */
function usePeopleChanged() {
  const queryClient = useQueryClient();
  return () => queryClient.invalidateQueries();
}

/** The request ids come from the caller, who keeps them for every repeat. */
export function useAddPerson() {
  const changed = usePeopleChanged();
  return useMutation({
    mutationFn: (request: AddPersonRequest) => api.post(paths.people, request, addPersonResponseSchema),
    onSuccess: changed,
  });
}

export function useJoinPerson() {
  const changed = usePeopleChanged();
  return useMutation({
    mutationFn: (request: JoinPersonRequest) => api.post(paths.peopleJoin, request, personResponseSchema),
    onSuccess: changed,
  });
}

export function useChangePerson(personId: string) {
  const changed = usePeopleChanged();
  return useMutation({
    mutationFn: (request: ChangePersonRequest) => api.patch(paths.person(personId), request, personResponseSchema),
    onSuccess: changed,
    onError: (error) => {
      // The screen behind shows what there is to look at again.
      if (isProblem(error, 'people.changed-meanwhile')) void changed();
    },
  });
}

export function useGiveOneTimePassword(personId: string) {
  const changed = usePeopleChanged();
  return useMutation({
    mutationFn: (requestId: string) =>
      api.post(`${paths.person(personId)}/one-time-password`, { requestId }, oneTimePasswordResponseSchema),
    onSuccess: changed,
  });
}

export function useGivePin(personId: string) {
  const changed = usePeopleChanged();
  return useMutation({
    mutationFn: (requestId: string) => api.post(`${paths.person(personId)}/pin`, { requestId }, pinResponseSchema),
    onSuccess: changed,
  });
}
