import { serviceStateWords } from '#domain/catalogue/service-state-words';
import { sterilizerFieldsSchema, type SterilizerOnFile } from '#contract/equipment';
import { checkSterilizer } from '#domain/catalogue/check-equipment';
import { serviceStates, sizeClasses, type SterilizerFields } from '#domain/catalogue/equipment-fields';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch, type Control } from 'react-hook-form';
import type { z } from 'zod';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { CodesField, QuantityField } from '../../../components/stock/quantity-field';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { FilmPanel } from '../../../components/ui/film-panel';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { changesBetween, optionsOf, sizeClassWords } from '../equipment-words';
import { useKeepSterilizer } from '../mutations';
import { ChamberDrawing } from './chamber-drawing';

const formSchema = sterilizerFieldsSchema.superRefine((sterilizer, context) => {
  for (const { field, sentence } of checkSterilizer(sterilizer)) {
    context.addIssue({ code: 'custom', path: field === null ? [] : [field], message: sentence });
  }
});

type FormInput = z.input<typeof formSchema>;
type FormControl = Control<FormInput, unknown, SterilizerFields>;

function fieldsOf({ id: _id, version: _version, airRemoval: _test, ...fields }: SterilizerOnFile): FormInput {
  return fields;
}

const emptySterilizer = {
  code: '',
  number: '',
  name: '',
  sizeClass: 'large',
  steamLine: '',
  hasAirDetector: false,
  needsAirRemovalTest: true,
  serviceState: 'in-service',
} as const;

/** All that is stated of a sterilizer, with its chamber drawn from it. */
export function SterilizerForm({
  sterilizer,
  onLeave,
}: {
  sterilizer: SterilizerOnFile | null;
  onLeave: (openId?: string) => void;
}) {
  const keep = useKeepSterilizer();
  const write = useWrite();
  const announce = useAnnounce();
  const { register, control, handleSubmit, setError, formState } = useForm<FormInput, unknown, SterilizerFields>({
    resolver: zodResolver(formSchema),
    defaultValues:
      sterilizer === null ? { ...emptySterilizer, qualifiedPrograms: [], otherPrograms: [] } : fieldsOf(sterilizer),
  });
  const { errors } = formState;
  const send = handleSubmit(async (fields) => {
    const { code, number, ...changeable } = fields;
    const lists = {
      qualifiedPrograms: [...fields.qualifiedPrograms],
      otherPrograms: [...fields.otherPrograms],
    };
    try {
      const kept = await write((requestId) =>
        sterilizer === null
          ? keep.add({ ...changeable, ...lists, code, number, requestId })
          : keep.change(sterilizer.id, {
              ...changesBetween(sterilizer, { ...changeable, ...lists }),
              requestId,
              version: sterilizer.version,
            }),
      );
      announce(`${kept.name} is kept.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  return (
    <FormPage
      title={sterilizer === null ? 'Add a sterilizer' : `Change ${sterilizer.name}`}
      {...(sterilizer === null ? {} : { facts: sterilizer.code })}
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords={sterilizer === null ? 'Add the sterilizer' : 'Keep the changes'}
      isSending={keep.isPending}
      refusal={keep.error}
      problemCount={countProblems(errors)}
      aside={<DrawnWhileFilledIn control={control} />}
    >
      <FormPart
        title="What it is"
        {...(sterilizer === null
          ? { hint: 'Code and number stay for good: the number stands in every load number.' }
          : {})}
      >
        {sterilizer === null && (
          <>
            <TextField label="Code" isCode error={errors.code?.message} {...register('code')} />
            <TextField label="Number" isCode error={errors.number?.message} {...register('number')} />
          </>
        )}
        <TextField label="Name" error={errors.name?.message} {...register('name')} />
        <SelectField
          label="Service"
          options={optionsOf(serviceStates, serviceStateWords)}
          error={errors.serviceState?.message}
          {...register('serviceState')}
        />
        <TextField label="Steam line" isOptional error={errors.steamLine?.message} {...register('steamLine')} />
        <CheckboxField label="Air detector" className="self-end" {...register('hasAirDetector')} />
        <CheckboxField label="Air-removal test each day" className="self-end" {...register('needsAirRemovalTest')} />
      </FormPart>
      <FormPart title="Chamber" hint="The drain is measured from the left front corner of the lowest shelf.">
        <QuantityField control={control} name="chamberWidthMm" quantity="length" label="Width" />
        <QuantityField control={control} name="chamberDepthMm" quantity="length" label="Depth" />
        <QuantityField control={control} name="chamberHeightMm" quantity="length" label="Height" />
        <QuantityField control={control} name="drainXMm" quantity="length" label="Drain, to the right" />
        <QuantityField control={control} name="drainYMm" quantity="length" label="Drain, from the door" />
        <QuantityField control={control} name="greatestLoadMassKg" quantity="mass" label="Greatest load mass" />
        <SelectField
          label="Carts that fit"
          options={optionsOf(sizeClasses, sizeClassWords)}
          {...register('sizeClass')}
        />
      </FormPart>
      <FormPart
        title="Programs"
        hint="Codes, separated by spaces. Only those it is qualified for can be chosen for a load."
      >
        <CodesField control={control} name="qualifiedPrograms" label="Qualified for" />
        <CodesField control={control} name="otherPrograms" label="On its panel, not qualified" />
      </FormPart>
    </FormPage>
  );
}

function DrawnWhileFilledIn({ control }: { control: FormControl }) {
  const chamber = useWatch({ control });
  return (
    <FilmPanel seal="left" label="As it is filled in" className="px-5 py-4">
      <ChamberDrawing
        sterilizer={{
          chamberWidthMm: chamber.chamberWidthMm ?? 0,
          chamberDepthMm: chamber.chamberDepthMm ?? 0,
          chamberHeightMm: chamber.chamberHeightMm ?? 0,
          drainXMm: chamber.drainXMm ?? Number.NaN,
          drainYMm: chamber.drainYMm ?? Number.NaN,
        }}
      />
    </FilmPanel>
  );
}
