import { useFieldArray, useWatch } from 'react-hook-form';
import { FormPart } from '../../../components/stock/form-page';
import { QuantityField } from '../../../components/stock/quantity-field';
import { Button } from '../../../components/ui/button';
import { FieldError } from '../../../components/ui/field';
import { SelectField } from '../../../components/ui/select-field';
import type { ItemFormApi } from '../item-form';

const faceOptions = [
  { value: 'lid', label: 'Lid' },
  { value: 'base', label: 'Base' },
];

/** A first guess to put right: in the middle, half as long and half as wide as the container. */
function middle(lengthMm: number, widthMm: number, face: 'lid' | 'base') {
  const known = (value: number) => (Number.isFinite(value) && value > 0 ? value : 200);
  const [length, width] = [known(lengthMm), known(widthMm)];
  return {
    face,
    lengthMm: Math.round(length / 2),
    widthMm: Math.round(width / 2),
    xMm: Math.round(length / 4),
    yMm: Math.round(width / 4),
  };
}

/** Where a rigid container is open to steam: what may stand there follows from it. */
export function FiltersPart({ form: { control, register, formState, getValues } }: { form: ItemFormApi }) {
  const { fields, append, remove } = useFieldArray({ control, name: 'filterZones' });
  const packaging = useWatch({ control, name: 'packaging' });
  const errors = formState.errors.filterZones;
  if (packaging !== 'rigid-container') return null;

  function add(face: 'lid' | 'base') {
    append(middle(getValues('lengthMm'), getValues('widthMm'), face));
  }

  return (
    <FormPart title="Filters and valves" hint="Measured along its long side and across it, from its own corner.">
      <div className="col-span-full grid gap-4">
        {fields.map((field, at) => (
          <div
            key={field.id}
            role="group"
            aria-label={`Filter ${String(at + 1)}`}
            className="grid items-start gap-x-3 gap-y-3 border-b border-paper-3 pb-4 sm:grid-cols-2 tablet:grid-cols-[repeat(5,minmax(0,1fr))_auto]"
          >
            <SelectField label="On the" options={faceOptions} {...register(`filterZones.${at}.face`)} />
            <QuantityField control={control} name={`filterZones.${at}.lengthMm`} quantity="length" label="Length" />
            <QuantityField control={control} name={`filterZones.${at}.widthMm`} quantity="length" label="Width" />
            <QuantityField control={control} name={`filterZones.${at}.xMm`} quantity="length" label="From the end" />
            <QuantityField control={control} name={`filterZones.${at}.yMm`} quantity="length" label="From the side" />
            <Button
              kind="plain"
              aria-label={`Remove filter ${String(at + 1)}`}
              className="tablet:mt-5.5"
              onPress={() => {
                remove(at);
              }}
            >
              Remove
            </Button>
          </div>
        ))}
        <FieldError id="filter-zones-error" error={errors?.root?.message ?? errors?.message} />
        <div className="flex flex-wrap gap-2">
          <Button
            kind="quiet"
            size="small"
            icon="plus"
            onPress={() => {
              add('lid');
            }}
          >
            A filter in the lid
          </Button>
          <Button
            kind="quiet"
            size="small"
            icon="plus"
            onPress={() => {
              add('base');
            }}
          >
            A filter in the base
          </Button>
        </div>
      </div>
    </FormPart>
  );
}
