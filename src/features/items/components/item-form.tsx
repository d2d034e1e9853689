import type { Item } from '#contract/items';
import type { ItemFields } from '#domain/catalogue/item-fields';
import { expiryRules, itemKinds, metals, packagings, poses, pouchFacings } from '#domain/catalogue/item-fields';
import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm, useWatch } from 'react-hook-form';
import { kindInWords } from '../../../components/item-kind';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { CodesField, QuantityField } from '../../../components/stock/quantity-field';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { FilmPanel } from '../../../components/ui/film-panel';
import { SelectField } from '../../../components/ui/select-field';
import { TextAreaField, TextField } from '../../../components/ui/text-field';
import {
  changesOf,
  emptyItem,
  itemFormSchema,
  usualOfKind,
  type ItemFormApi,
  type ItemFormControl,
  type ItemFormInput,
} from '../item-form';
import { capital, facingWords, metalWords, packagingWords, poseWords } from '../item-words';
import { useAddItem, useChangeItem } from '../mutations';
import { itemQueries } from '../queries';
import { CyclesPart } from './cycles-part';
import { FiltersPart } from './filters-part';
import { ItemDrawing } from './item-drawing';

type ItemFormProps = {
  /** null: a new one. */
  item: Item | null;
  onLeave: (openId?: string) => void;
};

const kindOptions = itemKinds.map((value) => ({ value, label: capital(kindInWords(value)) }));
const packagingOptions = packagings.map((value) => ({ value, label: packagingWords[value] }));
const facingOptions = [
  { value: '', label: 'They do not say' },
  ...pouchFacings.map((value) => ({ value, label: facingWords[value] })),
];
const poseOptions = poses.map((value) => ({ value, label: poseWords[value] }));
const metalOptions = metals.map((value) => ({ value, label: metalWords[value] }));
const expiryOptions = expiryRules.map((value) => ({
  value,
  label: value === 'dated' ? 'After some days' : 'By event only',
}));

function emptyToNull(text: string | null): string | null {
  return text === null || text.trim() === '' ? null : text;
}

/** All that is stated of an item, with the item drawn from it while it is filled in. */
export function ItemForm({ item, onLeave }: ItemFormProps) {
  const announce = useAnnounce();
  const add = useAddItem();
  const change = useChangeItem(item?.id ?? '');
  const write = useWrite();
  const form = useForm<ItemFormInput, unknown, ItemFields>({
    resolver: zodResolver(itemFormSchema),
    defaultValues:
      item === null
        ? { ...emptyItem, standsOn: [], filterZones: [], cycleNeeds: [...emptyItem.cycleNeeds] }
        : fieldsOf(item),
  });
  const { handleSubmit, setError, formState } = form;
  const send = handleSubmit(async (fields) => {
    try {
      const kept = await write((requestId) =>
        item === null
          ? add.mutateAsync({ ...asStated(fields), requestId })
          : change.mutateAsync({ ...asStated(changesOf(item, fields)), requestId, version: item.version }),
      );
      announce(`${kept.name} is kept.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  const { isPending, error } = item === null ? add : change;
  return (
    <FormPage
      title={item === null ? 'Add an item' : `Change ${item.name}`}
      {...(item === null ? {} : { facts: item.code })}
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords={item === null ? 'Add the item' : 'Keep the changes'}
      isSending={isPending}
      refusal={error}
      problemCount={countProblems(formState.errors)}
      aside={<DrawnWhileFilledIn control={form.control} />}
    >
      <WhatItIs form={form} isNew={item === null} />
      <SizeAndMass form={form} />
      <FiltersPart form={form} />
      <HowItIsLoaded form={form} />
      <CyclesPart form={form} />
      <Papers form={form} />
    </FormPage>
  );
}

function fieldsOf({ id: _id, version: _version, ...fields }: Item): ItemFormInput {
  return fields;
}

/** Lists that the core keeps read-only, as the request has them. */
function asStated<Fields extends Partial<ItemFields>>(fields: Fields) {
  const { standsOn, filterZones, cycleNeeds, ...rest } = fields;
  return {
    ...rest,
    ...(standsOn === undefined ? {} : { standsOn: [...standsOn] }),
    ...(filterZones === undefined ? {} : { filterZones: [...filterZones] }),
    ...(cycleNeeds === undefined ? {} : { cycleNeeds: [...cycleNeeds] }),
  } as Omit<Fields, 'standsOn' | 'filterZones' | 'cycleNeeds'> & ItemFormInput;
}

function DrawnWhileFilledIn({ control }: { control: ItemFormControl }) {
  const item = useWatch({ control });
  return (
    <FilmPanel seal="left" label="As it is filled in" className="px-5 py-4">
      <ItemDrawing
        width={272}
        item={{
          kind: item.kind ?? 'wrapped-tray',
          pose: item.pose ?? 'flat',
          lengthMm: item.lengthMm ?? 0,
          widthMm: item.widthMm ?? 0,
          heightMm: item.heightMm ?? 0,
          filterZones: (item.filterZones ?? []).map((zone) => ({
            face: zone.face ?? 'lid',
            xMm: zone.xMm ?? 0,
            yMm: zone.yMm ?? 0,
            lengthMm: zone.lengthMm ?? 0,
            widthMm: zone.widthMm ?? 0,
          })),
        }}
      />
    </FilmPanel>
  );
}

type PartProps = { form: ItemFormApi };

function WhatItIs({ form, isNew }: PartProps & { isNew: boolean }) {
  const { register, formState, setValue } = form;
  const { errors } = formState;
  return (
    <FormPart title="What it is" {...(isNew ? { hint: 'The code is your own, and stays for good.' } : {})}>
      {isNew && <TextField label="Code" isCode error={errors.code?.message} {...register('code')} />}
      <TextField label="Name" error={errors.name?.message} className="sm:col-span-2" {...register('name')} />
      <SelectField
        label="Kind"
        options={kindOptions}
        error={errors.kind?.message}
        {...register('kind', {
          onChange: (event: { target: { value: ItemFields['kind'] } }) => {
            const kind = event.target.value;
            const usual = usualOfKind[kind];
            setValue('packaging', usual.packaging);
            setValue('pose', usual.pose);
            setValue('isPerforated', usual.isPerforated);
            if (kind !== 'rigid-container') setValue('filterZones', []);
            if (kind !== 'pouch') {
              setValue('preferredHolder', null);
              setValue('facing', null);
            }
          },
        })}
      />
      <SelectField
        label="Packed in"
        options={packagingOptions}
        error={errors.packaging?.message}
        {...register('packaging')}
      />
      <CheckboxField
        label="Implant"
        error={errors.isImplant?.message}
        className="self-end"
        {...register('isImplant')}
      />
      <TextField label="Used in" isOptional error={errors.service?.message} {...register('service')} />
      <TextAreaField
        label="What else people should know"
        isOptional
        rows={2}
        error={errors.note?.message}
        className="sm:col-span-2"
        {...register('note')}
      />
    </FormPart>
  );
}

function SizeAndMass({ form: { control, register, formState } }: PartProps) {
  const kind = useWatch({ control, name: 'kind' });
  return (
    <FormPart title="Size and mass">
      <QuantityField control={control} name="lengthMm" quantity="length" label="Long side, lying flat" />
      <QuantityField control={control} name="widthMm" quantity="length" label="Short side, lying flat" />
      <QuantityField
        control={control}
        name="heightMm"
        quantity="length"
        label={kind === 'pouch' ? 'Thickness when full' : 'Height, lying flat'}
      />
      <QuantityField control={control} name="massKg" quantity="mass" label="Mass with its packaging" />
      <QuantityField control={control} name="metalMassKg" quantity="mass" label="Of that, metal" />
      <SelectField
        label="Which metal"
        options={metalOptions}
        error={formState.errors.metal?.message}
        {...register('metal')}
      />
      <QuantityField control={control} name="textileMassKg" quantity="mass" label="Of that, textile" />
      <QuantityField control={control} name="massLimitKg" quantity="mass" label="Greatest mass by its IFU" isOptional />
    </FormPart>
  );
}

function HowItIsLoaded({ form: { control, register, formState } }: PartProps) {
  const kind = useWatch({ control, name: 'kind' });
  const holderKinds = useQuery(itemQueries.holderKinds());
  const holderOptions = [
    { value: '', label: 'None' },
    ...(holderKinds.data ?? []).map((one) => ({ value: one.code, label: `${one.code}, ${one.name}` })),
  ];
  const { errors } = formState;
  return (
    <FormPart title="How it is loaded">
      <SelectField label="Rests" options={poseOptions} error={errors.pose?.message} {...register('pose')} />
      <QuantityField
        control={control}
        name="clearanceMm"
        quantity="length"
        label="Free space on every side"
        isOptional
      />
      <CheckboxField label="Steam passes its floor" className="self-end" {...register('isPerforated')} />
      {kind === 'pouch' && (
        <SelectField
          // The list comes later than the form: only then can the kept choice be shown.
          key={holderKinds.isSuccess ? 'known' : 'unknown'}
          label="Kind of holder"
          options={holderOptions}
          error={errors.preferredHolder?.message}
          {...register('preferredHolder', { setValueAs: emptyToNull })}
        />
      )}
      {kind === 'pouch' && (
        <SelectField
          label="Its instructions on facing"
          options={facingOptions}
          error={errors.facing?.message}
          {...register('facing', { setValueAs: emptyToNull })}
        />
      )}
      <CodesField control={control} name="standsOn" label="May stand on these codes" />
      <QuantityField
        control={control}
        name="greatestStackHeightMm"
        quantity="length"
        label="Greatest height of the stack"
        isOptional
      />
    </FormPart>
  );
}

function Papers({ form: { control, register, formState, setValue } }: PartProps) {
  const rule = useWatch({ control, name: 'expiryRule' });
  const { errors } = formState;
  return (
    <FormPart title="Instructions, identifier, expiry">
      <TextField
        label="IFU reference"
        isOptional
        error={errors.ifuReference?.message}
        {...register('ifuReference', { setValueAs: emptyToNull })}
      />
      <TextField
        label="IFU revision"
        isOptional
        error={errors.ifuRevision?.message}
        {...register('ifuRevision', { setValueAs: emptyToNull })}
      />
      <TextField
        label="GTIN or HIBC"
        isOptional
        isCode
        error={errors.deviceIdentifier?.message}
        {...register('deviceIdentifier', { setValueAs: emptyToNull })}
      />
      <SelectField
        label="Expires"
        options={expiryOptions}
        error={errors.expiryRule?.message}
        {...register('expiryRule', {
          onChange: (event: { target: { value: string } }) => {
            if (event.target.value === 'event-related') setValue('expiryDays', null);
          },
        })}
      />
      {rule === 'dated' && (
        <QuantityField control={control} name="expiryDays" quantity="count" unit="days" label="Days after packing" />
      )}
      <QuantityField control={control} name="coolS" quantity="minutes" label="Cools before it is touched" />
    </FormPart>
  );
}
