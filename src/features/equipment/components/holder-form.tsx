import { holderFieldsSchema } from '#contract/equipment';
import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { countProblems, FormPage, FormPart } from '../../../components/stock/form-page';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { useKeepHolder } from '../mutations';
import { equipmentQueries, everything } from '../queries';

const formSchema = holderFieldsSchema.pick({ name: true, kind: true });
type FormInput = z.input<typeof formSchema>;
type FormOutput = z.output<typeof formSchema>;

/** One holder more: what is written on it, and its kind. Its place code is given when it is kept. */
export function HolderForm({ onLeave }: { onLeave: (openId?: string) => void }) {
  const kinds = useQuery(equipmentQueries.holderKinds.list(everything));
  const keep = useKeepHolder();
  const write = useWrite();
  const announce = useAnnounce();
  const { register, handleSubmit, setError, formState } = useForm<FormInput, unknown, FormOutput>({
    resolver: zodResolver(formSchema),
    defaultValues: { name: '', kind: '' },
  });
  const { errors } = formState;
  const send = handleSubmit(async (fields) => {
    try {
      const kept = await write((requestId) => keep.add({ ...fields, condition: 'good', requestId }));
      announce(`${kept.name} has the place code ${kept.placeCode}.`);
      onLeave(kept.id);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  return (
    <FormPage
      title="Add a holder"
      onSend={() => void send()}
      onLeave={() => {
        onLeave();
      }}
      sendWords="Add the holder"
      isSending={keep.isPending}
      refusal={keep.error}
      problemCount={countProblems(errors)}
    >
      <FormPart title="What it is" hint="It gets a place code of its own when it is kept.">
        <SelectField
          label="Kind"
          placeholder="Choose a kind"
          options={(kinds.data?.holderKinds ?? []).map((kind) => ({
            value: kind.code,
            label: `${kind.code}, ${kind.name}`,
          }))}
          error={errors.kind?.message}
          {...register('kind')}
        />
        <TextField label="Name, as written on it" isCode error={errors.name?.message} {...register('name')} />
      </FormPart>
    </FormPage>
  );
}
