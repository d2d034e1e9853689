import { textColumn, yesNoColumn, type ColumnSet } from '../catalogue/csv-column';

/** What a person states about a package that was packed. */
export type PackageFields = {
  /** As printed; empty for a package that has no label yet. */
  readonly code: string;
  readonly itemCode: string;
  readonly isContentsConfirmed: boolean;
  readonly hasInternalIndicator: boolean;
  readonly hasExternalIndicator: boolean;
  readonly destination: string;
};

/** The packages file: one line per package. A line without a code packs one and gives it its code. */
export const packageColumns: ColumnSet<PackageFields> = {
  code: {
    ...textColumn({
      name: 'code',
      about: 'As printed on its label. Empty: a package packed now, which gets its code.',
      example: '',
    }),
    whenEmpty: '',
  },
  itemCode: textColumn({ name: 'item', about: 'Code of the item in your catalogue.', example: 'W-01' }),
  isContentsConfirmed: yesNoColumn(
    {
      name: 'contents_confirmed',
      about: 'Whether a person checked the contents: yes or no. Empty: no.',
      example: 'yes',
    },
    false,
  ),
  hasInternalIndicator: yesNoColumn(
    { name: 'internal_ci', about: 'Whether an internal CI lies inside: yes or no. Empty: no.', example: 'yes' },
    false,
  ),
  hasExternalIndicator: yesNoColumn(
    { name: 'external_ci', about: 'Whether an external CI is on it: yes or no. Empty: no.', example: 'yes' },
    false,
  ),
  destination: {
    ...textColumn({ name: 'goes_to', about: 'Where it is wanted. Empty: nowhere yet.', example: 'OR 4' }),
    whenEmpty: '',
  },
};
