import { holderKindFieldsSchema, type HolderKindOnFile } from '#contract/equipment';
import { checkHolderKind } from '#domain/catalogue/check-equipment';
import { holderForms, type HolderKindFields } from '#domain/catalogue/equipment-fields';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch, type Control } from 'react-hook-form';
import type { z } from 'zod';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { QuantityField } from '../../../components/stock/quantity-field';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { FilmPanel } from '../../../components/ui/film-panel';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { changesBetween, formWords, optionsOf } from '../equipment-words';
import { useKeepHolderKind } from '../mutations';
import { RackDrawing } from './rack-drawing';

const formSchema = holderKindFieldsSchema.superRefine((kind, context) => {
  for (const { field, sentence } of checkHolderKind(kind)) {
    context.addIssue({ code: 'custom', path: field === null ? [] : [field], message: sentence });
  }
});

type FormInput = z.input<typeof formSchema>;
type FormControl = Control<FormInput, unknown, HolderKindFields>;

function fieldsOf({
  id: _id,
  version: _version,
  coded: _coded,
  inGoodOrder: _good,
  ...fields
}: HolderKindOnFile): FormInput {
  return fields;
}

const emptyKind = {
  code: '',
  name: '',
  form: 'rack',
  slots: null,
  pitchMm: null,
  greatestHeightMm: null,
  greatestLengthMm: null,
  greatestThicknessMm: null,
  owned: 0,
} as const;

/** What a kind of holder takes, drawn from its end while it is filled in. */
export function HolderKindForm({
  kind,
  onLeave,
}: {
  kind: HolderKindOnFile | null;
  onLeave: (openId?: string) => void;
}) {
  const keep = useKeepHolderKind();
  const write = useWrite();
  const announce = useAnnounce();
  const { register, control, handleSubmit, setError, setValue, formState } = useForm<
    FormInput,
    unknown,
    HolderKindFields
  >({
    resolver: zodResolver(formSchema),
    defaultValues: kind === null ? emptyKind : fieldsOf(kind),
  });
  const form = useWatch({ control, name: 'form' });
  const { errors } = formState;
  const send = handleSubmit(async (fields) => {
    const { code: _code, ...changeable } = fields;
    try {
      const kept = await write((requestId) =>
        kind === null
          ? keep.add({ ...fields, requestId })
          : keep.change(kind.id, { ...changesBetween(kind, changeable), requestId, version: kind.version }),
      );
      announce(`${kept.name} is kept.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  return (
    <FormPage
      title={kind === null ? 'Add a kind of holder' : `Change ${kind.name}`}
      {...(kind === null ? {} : { facts: kind.code })}
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords={kind === null ? 'Add the kind' : 'Keep the changes'}
      isSending={keep.isPending}
      refusal={keep.error}
      problemCount={countProblems(errors)}
      aside={<DrawnWhileFilledIn control={control} />}
    >
      <FormPart title="What it is" {...(kind === null ? { hint: 'The code is your own, and stays for good.' } : {})}>
        {kind === null && <TextField label="Code" isCode error={errors.code?.message} {...register('code')} />}
        <TextField label="Name" error={errors.name?.message} {...register('name')} />
        <SelectField
          label="Form"
          options={optionsOf(holderForms, formWords)}
          {...register('form', {
            onChange: (event: { target: { value: string } }) => {
              if (event.target.value !== 'rack') setValue('slots', null);
            },
          })}
        />
        <QuantityField control={control} name="owned" quantity="count" label="How many you own" />
      </FormPart>
      {form === 'rack' && (
        <FormPart
          title="What it takes"
          hint="The greatest pouch that stands in a slot without leaning or being pressed."
        >
          <QuantityField control={control} name="slots" quantity="count" label="Slots" />
          <QuantityField control={control} name="pitchMm" quantity="length" label="From slot to slot" />
          <QuantityField control={control} name="greatestThicknessMm" quantity="length" label="Greatest thickness" />
          <QuantityField control={control} name="greatestHeightMm" quantity="length" label="Greatest height" />
          <QuantityField control={control} name="greatestLengthMm" quantity="length" label="Greatest length" />
        </FormPart>
      )}
      <FormPart title="The holder itself">
        <QuantityField control={control} name="acrossMm" quantity="length" label="Size across" />
        <QuantityField control={control} name="alongMm" quantity="length" label="Size along" />
        <QuantityField control={control} name="massKg" quantity="mass" label="Mass" />
      </FormPart>
    </FormPage>
  );
}

function DrawnWhileFilledIn({ control }: { control: FormControl }) {
  const kind = useWatch({ control });
  return (
    <FilmPanel seal="left" label="As it is filled in" className="px-5 py-4">
      <RackDrawing
        kind={{
          form: kind.form ?? 'rack',
          slots: kind.slots ?? null,
          pitchMm: kind.pitchMm ?? null,
          greatestHeightMm: kind.greatestHeightMm ?? null,
          greatestThicknessMm: kind.greatestThicknessMm ?? null,
          acrossMm: kind.acrossMm ?? 0,
        }}
      />
      <p className="mt-2 text-small text-ink-2">A rack is drawn once its figures are filled in.</p>
    </FilmPanel>
  );
}
