import {
  cartSchema,
  holderKindSchema,
  holderSchema,
  programSchema,
  sterilizerSchema,
  type addCartRequestSchema,
  type addHolderKindRequestSchema,
  type addHolderRequestSchema,
  type addProgramRequestSchema,
  type addSterilizerRequestSchema,
  type changeCartRequestSchema,
  type changeHolderKindRequestSchema,
  type changeHolderRequestSchema,
  type changeProgramRequestSchema,
  type changeSterilizerRequestSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { api } from '../../lib/api-client';

/**
 * Adds one, or changes the one with this id. Once it is kept, every screen that shows it is asked for again; the change
 * counts as done only then.
 */
function useKeep<Add extends z.ZodType, Change extends z.ZodType, Reply>(
  path: string,
  schema: z.ZodType<Reply>,
): {
  readonly add: (request: z.input<Add>) => Promise<Reply>;
  readonly change: (id: string, request: z.input<Change>) => Promise<Reply>;
  readonly isPending: boolean;
  readonly error: Error | null;
} {
  const queryClient = useQueryClient();
  const keep = useMutation({
    mutationFn: ({ id, request }: { readonly id: string | null; readonly request: unknown }) =>
      id === null ? api.post(path, request, schema) : api.patch(`${path}/${id}`, request, schema),
    onSuccess: () => queryClient.invalidateQueries(),
  });
  return {
    add: (request) => keep.mutateAsync({ id: null, request }),
    change: (id, request) => keep.mutateAsync({ id, request }),
    isPending: keep.isPending,
    error: keep.error,
  };
}

export function useKeepProgram() {
  return useKeep<typeof addProgramRequestSchema, typeof changeProgramRequestSchema, z.output<typeof programSchema>>(
    paths.programs,
    programSchema,
  );
}

export function useKeepSterilizer() {
  return useKeep<
    typeof addSterilizerRequestSchema,
    typeof changeSterilizerRequestSchema,
    z.output<typeof sterilizerSchema>
  >(paths.sterilizers, sterilizerSchema);
}

export function useKeepCart() {
  return useKeep<typeof addCartRequestSchema, typeof changeCartRequestSchema, z.output<typeof cartSchema>>(
    paths.carts,
    cartSchema,
  );
}

export function useKeepHolderKind() {
  return useKeep<
    typeof addHolderKindRequestSchema,
    typeof changeHolderKindRequestSchema,
    z.output<typeof holderKindSchema>
  >(paths.holderKinds, holderKindSchema);
}

export function useKeepHolder() {
  return useKeep<typeof addHolderRequestSchema, typeof changeHolderRequestSchema, z.output<typeof holderSchema>>(
    paths.holders,
    holderSchema,
  );
}
