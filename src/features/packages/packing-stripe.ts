import type { Stretch } from '../../components/proof-stripe';

/** What a person has said of what is being packed. */
export type Said = { readonly contents: boolean; readonly internal: boolean; readonly external: boolean };

/** Each thing said welds its stretch; the label is the last one. `labels`: how many were printed, null before. */
export function packingStripe(item: { readonly code: string }, said: Said, labels: number | null): readonly Stretch[] {
  const stretch = (label: string, isSaid: boolean, words: string): Stretch =>
    isSaid ? { label, state: 'proven', words } : { label, state: 'not-yet' };
  return [
    { label: 'Item', state: 'proven', words: item.code },
    stretch('Contents', said.contents, 'complete'),
    stretch('Internal CI', said.internal, 'inside'),
    stretch('External CI', said.external, 'on it'),
    stretch('Label', labels !== null, labels === 1 ? 'printed' : `${labels ?? 0} printed`),
  ];
}
