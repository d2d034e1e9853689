import { itemFieldsSchema, type Item, type ItemFieldsInput } from '#contract/items';
import { checkItem } from '#domain/catalogue/check-item';
import type { ItemFields } from '#domain/catalogue/item-fields';
import type { Control, UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';

/** What the server will look at, looked at here first: each value alone, then how they hold together. */
export const itemFormSchema = itemFieldsSchema.superRefine((item, context) => {
  for (const { field, sentence } of checkItem(item)) {
    context.addIssue({ code: 'custom', path: field === null ? [] : [field], message: sentence });
  }
});

export type ItemFormInput = z.input<typeof itemFormSchema>;
export type ItemFormApi = UseFormReturn<ItemFormInput, unknown, ItemFields>;
export type ItemFormControl = Control<ItemFormInput, unknown, ItemFields>;

/** Where a new item begins: what most are. Figures begin empty, so that nobody keeps one by mistake. */
export const emptyItem = {
  code: '',
  name: '',
  kind: 'wrapped-tray',
  packaging: 'wrap',
  metalMassKg: 0,
  textileMassKg: 0,
  metal: 'stainless-steel',
  isImplant: false,
  pose: 'flat',
  isPerforated: true,
  clearanceMm: null,
  standsOn: [],
  greatestStackHeightMm: null,
  filterZones: [],
  cycleNeeds: [
    { type: 'dynamic-air-removal', temperatureC: 132, leastExposureS: 240, greatestExposureS: null, leastDryS: 1_800 },
  ],
  preferredHolder: null,
  facing: null,
  massLimitKg: null,
  coolS: 1_800,
  expiryRule: 'event-related',
  expiryDays: null,
  deviceIdentifier: null,
  ifuReference: null,
  ifuRevision: null,
  service: '',
  note: '',
  isRetired: false,
} as const satisfies Partial<ItemFieldsInput>;

/** What goes with a kind, for when the kind is chosen. */
export const usualOfKind: Readonly<
  Record<ItemFields['kind'], Pick<ItemFields, 'packaging' | 'pose' | 'isPerforated'>>
> = {
  pouch: { packaging: 'paper-film-pouch', pose: 'on-edge', isPerforated: true },
  'rigid-container': { packaging: 'rigid-container', pose: 'flat', isPerforated: true },
  'wrapped-tray': { packaging: 'wrap', pose: 'flat', isPerforated: true },
  basin: { packaging: 'wrap', pose: 'tilted', isPerforated: false },
  'textile-pack': { packaging: 'wrap', pose: 'on-edge', isPerforated: true },
  'challenge-device': { packaging: 'wrap', pose: 'flat', isPerforated: true },
};

/** Only what differs from what is kept. */
export function changesOf(item: Item, fields: ItemFields): Partial<ItemFields> {
  const { code: _code, ...changeable } = fields;
  const changed = Object.entries(changeable).filter(
    ([name, value]) => JSON.stringify(item[name as keyof typeof changeable]) !== JSON.stringify(value),
  );
  return Object.fromEntries(changed);
}
