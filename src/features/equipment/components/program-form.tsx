import { programFieldsSchema, type ProgramOnFile } from '#contract/equipment';
import type { ProgramFields } from '#domain/catalogue/equipment-fields';
import { cycleChanges } from '#domain/catalogue/cycle-change';
import { cycleTypes } from '#domain/catalogue/cycle-need-text';
import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { cycleTypeWords } from '../../../components/stock/cycle-words';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { QuantityField } from '../../../components/stock/quantity-field';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { listInWords } from '../../../lib/format';
import { changesBetween, optionsOf } from '../equipment-words';
import { useKeepProgram } from '../mutations';

type FormInput = z.input<typeof programFieldsSchema>;

function fieldsOf({ id: _id, version: _version, qualifiedOn: _on, ...fields }: ProgramOnFile): FormInput {
  return fields;
}

/** What a program does. Which sterilizers are qualified for it is said at the sterilizer. */
export function ProgramForm({
  program,
  onLeave,
}: {
  program: ProgramOnFile | null;
  onLeave: (openId?: string) => void;
}) {
  const keep = useKeepProgram();
  const write = useWrite();
  const announce = useAnnounce();
  const { register, control, handleSubmit, setError, formState } = useForm<FormInput, unknown, ProgramFields>({
    resolver: zodResolver(programFieldsSchema),
    defaultValues:
      program === null
        ? { code: '', name: '', type: 'dynamic-air-removal', greatestLoadMassKg: null, isRetired: false }
        : fieldsOf(program),
  });
  const { errors } = formState;
  const [asking, setAsking] = useState<ProgramFields | null>(null);
  const qualifiedOn = program?.qualifiedOn ?? [];

  async function sendFields(fields: ProgramFields) {
    const { code: _code, ...changeable } = fields;
    try {
      const kept = await write((requestId) =>
        program === null
          ? keep.add({ ...fields, requestId })
          : keep.change(program.id, { ...changesBetween(program, changeable), requestId, version: program.version }),
      );
      announce(`${kept.code} is kept.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
      throw error;
    }
  }

  const send = handleSubmit(async (fields) => {
    if (program !== null && qualifiedOn.length > 0 && cycleChanges(program, fields).length > 0) setAsking(fields);
    else await sendFields(fields).catch(() => undefined);
  });
  return (
    <FormPage
      title={program === null ? 'Add a program' : `Change ${program.code}`}
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords={program === null ? 'Add the program' : 'Keep the changes'}
      isSending={keep.isPending}
      refusal={keep.error}
      problemCount={countProblems(errors)}
    >
      <FormPart title="What it is" {...(program === null ? { hint: 'The code is your own, and stays for good.' } : {})}>
        {program === null && <TextField label="Code" isCode error={errors.code?.message} {...register('code')} />}
        <TextField label="Name" error={errors.name?.message} className="sm:col-span-2" {...register('name')} />
      </FormPart>
      <FormPart
        title="What it does"
        {...(qualifiedOn.length > 0
          ? {
              hint: (
                <span className="block border-l-4 border-straw-3 bg-straw-1 px-4 py-2.5 text-row text-ink-1">
                  {listInWords(qualifiedOn)} {qualifiedOn.length === 1 ? 'is' : 'are'} qualified for this cycle. Another
                  type, temperature, exposure or drying makes it another cycle, and takes the qualification away. To
                  keep it, leave these as they are and add a program of its own.
                </span>
              ),
            }
          : {})}
      >
        <SelectField
          label="Type"
          options={optionsOf(cycleTypes, cycleTypeWords)}
          error={errors.type?.message}
          {...register('type')}
        />
        <QuantityField control={control} name="temperatureC" quantity="temperature" label="Temperature" />
        <QuantityField control={control} name="exposureS" quantity="minutes" label="Exposure" />
        <QuantityField control={control} name="dryS" quantity="minutes" label="Dry" />
        <QuantityField control={control} name="greatestLoadMassKg" quantity="mass" label="Greatest mass" isOptional />
        {program !== null && (
          <CheckboxField
            label="Retired"
            hint="It is no longer offered for a load."
            className="self-end"
            {...register('isRetired')}
          />
        )}
      </FormPart>
      {asking !== null && (
        <ConfirmDialog
          isOpen
          onClose={() => {
            setAsking(null);
          }}
          title={`Take the qualification for ${program?.code ?? ''} away?`}
          confirmWords="Change the cycle"
          waitingWords="Changing it"
          kind="stop"
          onConfirm={() => sendFields(asking)}
        >
          {`With this change it is another cycle. No load can be opened with it on ${listInWords(qualifiedOn)} until somebody says there that it is qualified again; a load being built with it cannot be closed.`}
        </ConfirmDialog>
      )}
    </FormPage>
  );
}
