import { useAddress } from '../../lib/use-address';

/** What is searched, shown and open on a list of the stock lives in the address: it can be sent, and "back" goes back. */
export function useShelfAddress() {
  const { params, write: set } = useAddress();
  const form = params.get('form');
  const page = Number(params.get('page') ?? '1');
  return {
    search: params.get('search') ?? '',
    isRetiredShown: params.get('retired') === 'shown',
    page: Number.isInteger(page) && page > 0 ? page : 1,
    kind: params.get('kind'),
    chosenId: params.get('open'),
    /** The form in place of the list: for something new, or for what is open. */
    form: form === 'new' || form === 'change' ? form : null,
    isImporting: form === 'import',
    setSearch: (text: string) => {
      set({ search: text, page: null });
    },
    showAll: () => {
      set({ search: null, kind: null, page: null });
    },
    setRetiredShown: (isShown: boolean) => {
      set({ retired: isShown ? 'shown' : null, page: null });
    },
    setPage: (number: number) => {
      set({ page: number === 1 ? null : String(number) });
    },
    setKind: (kind: string | null) => {
      set({ kind, page: null });
    },
    open: (id: string | null) => {
      set({ open: id });
    },
    showForm: (which: 'new' | 'change' | 'import') => {
      set({ form: which }, true);
    },
    leaveForm: (openId?: string) => {
      set(openId === undefined ? { form: null } : { form: null, open: openId });
    },
  };
}

export type ShelfAddress = ReturnType<typeof useShelfAddress>;
