import { cartFieldsSchema, type CartOnFile } from '#contract/equipment';
import { checkCart } from '#domain/catalogue/check-equipment';
import { sizeClasses, surfaces, type CartFields } from '#domain/catalogue/equipment-fields';
import { zodResolver } from '@hookform/resolvers/zod';
import { useFieldArray, useForm, useWatch, type Control, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { QuantityField } from '../../../components/stock/quantity-field';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { FieldError } from '../../../components/ui/field';
import { FilmPanel } from '../../../components/ui/film-panel';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { changesBetween, optionsOf, sizeClassWords, surfaceWords } from '../equipment-words';
import { useKeepCart } from '../mutations';
import { CartDrawing } from './cart-drawing';

const formSchema = cartFieldsSchema.superRefine((cart, context) => {
  for (const { field, sentence } of checkCart(cart)) {
    context.addIssue({ code: 'custom', path: field === null ? [] : [field], message: sentence });
  }
});

type FormInput = z.input<typeof formSchema>;
type FormApi = UseFormReturn<FormInput, unknown, CartFields>;
type FormControl = Control<FormInput, unknown, CartFields>;

function fieldsOf({ id: _id, version: _version, shelves, ...own }: CartOnFile): FormInput {
  return { ...own, shelves: shelves.map(({ id: _shelfId, placeCode: _code, ...shelf }) => shelf) };
}

const lowerShelf = { level: 1, name: 'Lower shelf', surface: 'wire', isUsable: true } as const;

/** A cart and its shelves. A shelf stays for good, since loads refer to it: it can be taken out of use. */
export function CartForm({ cart, onLeave }: { cart: CartOnFile | null; onLeave: (openId?: string) => void }) {
  const keep = useKeepCart();
  const write = useWrite();
  const announce = useAnnounce();
  const form: FormApi = useForm<FormInput, unknown, CartFields>({
    resolver: zodResolver(formSchema),
    defaultValues:
      cart === null
        ? { code: '', name: '', sizeClass: 'large', isUsable: true, note: '', shelves: [lowerShelf] }
        : fieldsOf(cart),
  });
  const { register, control, handleSubmit, setError, formState } = form;
  const { errors } = formState;
  const send = handleSubmit(async ({ code, shelves, ...own }) => {
    const stated = { ...own, shelves: [...shelves] };
    try {
      const kept = await write((requestId) =>
        cart === null
          ? keep.add({ ...stated, code, requestId })
          : keep.change(cart.id, { ...changesBetween(fieldsOf(cart), stated), requestId, version: cart.version }),
      );
      announce(`${kept.name} is kept.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  return (
    <FormPage
      title={cart === null ? 'Add a cart' : `Change ${cart.name}`}
      {...(cart === null ? {} : { facts: cart.code })}
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords={cart === null ? 'Add the cart' : 'Keep the changes'}
      isSending={keep.isPending}
      refusal={keep.error}
      problemCount={countProblems(errors)}
      aside={<DrawnWhileFilledIn control={control} />}
    >
      <FormPart title="What it is" {...(cart === null ? { hint: 'The code is your own, and stays for good.' } : {})}>
        {cart === null && <TextField label="Code" isCode error={errors.code?.message} {...register('code')} />}
        <TextField label="Name" error={errors.name?.message} {...register('name')} />
        <SelectField label="Size" options={optionsOf(sizeClasses, sizeClassWords)} {...register('sizeClass')} />
        <TextField label="Remark" isOptional error={errors.note?.message} {...register('note')} />
        <CheckboxField label="In use" className="self-end" {...register('isUsable')} />
      </FormPart>
      <ShelvesPart form={form} kept={cart?.shelves.length ?? 0} />
    </FormPage>
  );
}

function ShelvesPart({ form: { control, register, formState, getValues }, kept }: { form: FormApi; kept: number }) {
  const { fields, append, remove } = useFieldArray({ control, name: 'shelves' });
  const errors = formState.errors.shelves;
  return (
    <FormPart title="Shelves" hint="Level 1 is the lowest. Each gets a place code of its own, for good.">
      <div className="col-span-full grid gap-4">
        {fields.map((field, at) => (
          <div
            key={field.id}
            role="group"
            aria-label={`Shelf ${String(at + 1)}`}
            className="grid items-start gap-x-4 gap-y-3 border-b border-paper-3 pb-4 sm:grid-cols-2 tablet:grid-cols-4"
          >
            <QuantityField control={control} name={`shelves.${at}.level`} quantity="count" label="Level" />
            <TextField label="Name" error={errors?.[at]?.name?.message} {...register(`shelves.${at}.name`)} />
            <QuantityField control={control} name={`shelves.${at}.widthMm`} quantity="length" label="Width" />
            <QuantityField control={control} name={`shelves.${at}.depthMm`} quantity="length" label="Depth" />
            <QuantityField
              control={control}
              name={`shelves.${at}.clearHeightMm`}
              quantity="length"
              label="Clear height"
            />
            <QuantityField
              control={control}
              name={`shelves.${at}.greatestMassKg`}
              quantity="mass"
              label="Carries at most"
            />
            <SelectField
              label="Made of"
              options={optionsOf(surfaces, surfaceWords)}
              {...register(`shelves.${at}.surface`)}
            />
            <span className="flex items-end justify-between gap-2 self-end">
              <CheckboxField label="In use" {...register(`shelves.${at}.isUsable`)} />
              {at >= kept && fields.length > 1 && (
                <Button
                  kind="plain"
                  aria-label={`Remove shelf ${String(at + 1)}`}
                  onPress={() => {
                    remove(at);
                  }}
                >
                  Remove
                </Button>
              )}
            </span>
          </div>
        ))}
        <FieldError id="shelves-error" error={errors?.root?.message ?? errors?.message} />
        <Button
          kind="quiet"
          size="small"
          icon="plus"
          className="justify-self-start"
          onPress={() => {
            const last = getValues('shelves').at(-1);
            append({
              ...lowerShelf,
              level: fields.length + 1,
              name: 'Upper shelf',
              widthMm: last?.widthMm ?? 0,
              depthMm: last?.depthMm ?? 0,
              clearHeightMm: last?.clearHeightMm ?? 0,
              greatestMassKg: last?.greatestMassKg ?? 0,
            });
          }}
        >
          Another shelf
        </Button>
      </div>
    </FormPart>
  );
}

function DrawnWhileFilledIn({ control }: { control: FormControl }) {
  const { name, shelves } = useWatch({ control });
  return (
    <FilmPanel seal="left" label="As it is filled in" className="px-5 py-4">
      <CartDrawing
        cart={{
          name: name ?? '',
          shelves: (shelves ?? []).map((shelf, at) => ({
            level: shelf.level ?? at + 1,
            name: shelf.name ?? '',
            widthMm: shelf.widthMm ?? 0,
            clearHeightMm: shelf.clearHeightMm ?? 0,
            isUsable: shelf.isUsable ?? true,
          })),
        }}
      />
    </FilmPanel>
  );
}
