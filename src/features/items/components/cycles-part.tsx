import { cycleTypes } from '#domain/catalogue/cycle-need-text';
import { useFieldArray } from 'react-hook-form';
import { cycleTypeWords } from '../../../components/stock/cycle-words';
import { FormPart } from '../../../components/stock/form-page';
import { QuantityField } from '../../../components/stock/quantity-field';
import { Button } from '../../../components/ui/button';
import { FieldError } from '../../../components/ui/field';
import { SelectField } from '../../../components/ui/select-field';
import type { ItemFormApi } from '../item-form';

const typeOptions = cycleTypes.map((value) => ({ value, label: cycleTypeWords[value] }));

/** Cycles the instructions permit: each a whole of its own, not a range to pick from. */
export function CyclesPart({ form: { control, register, formState } }: { form: ItemFormApi }) {
  const { fields, append, remove } = useFieldArray({ control, name: 'cycleNeeds' });
  const errors = formState.errors.cycleNeeds;
  return (
    <FormPart
      title="Cycles its instructions permit"
      hint="Each as the instructions state it. Several cycles are several lines, never one wider one."
    >
      <div className="col-span-full grid gap-4">
        {fields.map((field, at) => (
          <div
            key={field.id}
            role="group"
            aria-label={`Cycle ${String(at + 1)}`}
            className="grid items-start gap-x-3 gap-y-3 border-b border-paper-3 pb-4 sm:grid-cols-2 tablet:grid-cols-[minmax(9rem,1.5fr)_repeat(4,minmax(0,1fr))_auto]"
          >
            <SelectField label="Type" options={typeOptions} {...register(`cycleNeeds.${at}.type`)} />
            <QuantityField
              control={control}
              name={`cycleNeeds.${at}.temperatureC`}
              quantity="temperature"
              label="Temperature"
            />
            <QuantityField
              control={control}
              name={`cycleNeeds.${at}.leastExposureS`}
              quantity="minutes"
              label="Least"
            />
            <QuantityField
              control={control}
              name={`cycleNeeds.${at}.greatestExposureS`}
              quantity="minutes"
              label="Greatest"
              isOptional
            />
            <QuantityField control={control} name={`cycleNeeds.${at}.leastDryS`} quantity="minutes" label="Dry" />
            <Button
              kind="plain"
              aria-label={`Remove cycle ${String(at + 1)}`}
              className="tablet:mt-5.5"
              onPress={() => {
                remove(at);
              }}
            >
              Remove
            </Button>
          </div>
        ))}
        <FieldError id="cycle-needs-error" error={errors?.root?.message ?? errors?.message} />
        <Button
          kind="quiet"
          size="small"
          icon="plus"
          className="justify-self-start"
          onPress={() => {
            append({
              type: 'dynamic-air-removal',
              temperatureC: 134,
              leastExposureS: 180,
              greatestExposureS: null,
              leastDryS: 1_200,
            });
          }}
        >
          Another cycle
        </Button>
      </div>
    </FormPart>
  );
}
