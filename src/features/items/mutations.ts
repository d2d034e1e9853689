import { itemSchema, type AddItemRequest, type ChangeItemRequest } from '#contract/items';
import { paths } from '#contract/paths';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../lib/api-client';

/** Once an item was changed, every screen that shows it is asked for again; the change counts as done only then. */
function useItemsChanged() {
  const queryClient = useQueryClient();
  return () => queryClient.invalidateQueries();
}

export function useAddItem() {
  const changed = useItemsChanged();
  return useMutation({
    mutationFn: (request: AddItemRequest) => api.post(paths.items, request, itemSchema),
    onSuccess: changed,
  });
}

export function useChangeItem(itemId: string) {
  const changed = useItemsChanged();
  return useMutation({
    mutationFn: (request: ChangeItemRequest) => api.patch(`${paths.items}/${itemId}`, request, itemSchema),
    onSuccess: changed,
  });
}
