import type { AirRemovalTest } from '#contract/air-removal-tests';
import type { SterilizerOnFile } from '#contract/equipment';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import { showAtFields, useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { RadioGroupField } from '../../../components/ui/radio-group-field';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { isProblem, sentenceOf } from '../../../lib/errors';
import { useFacility } from '../../../lib/facility';
import { serverNow } from '../../../lib/server-clock';
import { useSession } from '../../../lib/session';
import { useRecordAirRemovalTest } from '../mutations';
import {
  airRemovalTestFormSchema,
  wallTextOf,
  type AirRemovalTestInput,
  type AirRemovalTestOutput,
} from '../test-form';

type AirRemovalFormProps = {
  sterilizers: readonly SterilizerOnFile[];
  sterilizerId: string | null;
  readers: readonly { readonly id: string; readonly name: string }[];
  /** The pack of the test before: the box is mostly the same one. */
  lastPack: AirRemovalTest | null;
  onSterilizer: (id: string) => void;
};

/** What the sheet showed. A failed test offers to take the sterilizer out of service with it. */
export function AirRemovalForm({ sterilizers, sterilizerId, readers, lastPack, onSterilizer }: AirRemovalFormProps) {
  const { timeZone } = useFacility();
  const { person } = useSession();
  const record = useRecordAirRemovalTest();
  const write = useWrite();
  const announce = useAnnounce();
  const { register, control, handleSubmit, setError, setValue, formState } = useForm<
    AirRemovalTestInput,
    unknown,
    AirRemovalTestOutput
  >({
    resolver: zodResolver(airRemovalTestFormSchema(timeZone)),
    defaultValues: {
      sterilizerId: sterilizerId ?? '',
      testedAt: wallTextOf(serverNow(), timeZone),
      packLot: lastPack?.packLot ?? '',
      packExpiresOn: lastPack?.packExpiresOn ?? '',
      isBeforeFirstLoad: true,
      secondReaderId: '',
      note: '',
      isTakenOutOfService: false,
    },
  });
  const { errors } = formState;
  const result = useWatch({ control, name: 'result' });
  const chosen = sterilizers.find((one) => one.id === sterilizerId);
  const send = handleSubmit(async (test) => {
    // The box goes with a failed test only, and may have been ticked before the result was put right.
    const isTakenOutOfService = test.result === 'failed' && test.isTakenOutOfService;
    try {
      const reply = await write((requestId) => record.mutateAsync({ ...test, isTakenOutOfService, requestId }));
      const { code } = reply.test.sterilizer;
      announce(
        reply.serviceState === 'out-of-service' ? `${code} is out of service.` : `${code}: test ${reply.test.result}.`,
      );
      // The next one is another test: nothing that was read from this sheet stays.
      setValue('note', '');
      setValue('isTakenOutOfService', false);
    } catch (error) {
      showAtFields(error, setError);
    }
  });
  const refusal =
    record.error === null || (isProblem(record.error) && record.error.fields.length > 0) ? null : record.error;
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
      className="grid content-start gap-5"
    >
      <div className="grid items-start gap-x-4 gap-y-5 sm:grid-cols-2">
        <SelectField
          label="Sterilizer"
          placeholder="Choose a sterilizer"
          options={sterilizers
            .filter((one) => one.needsAirRemovalTest || one.id === sterilizerId)
            .map((one) => ({ value: one.id, label: `${one.code}, ${one.name}` }))}
          error={errors.sterilizerId?.message}
          {...register('sterilizerId', {
            onChange: (event: { target: { value: string } }) => {
              if (event.target.value !== '') onSterilizer(event.target.value);
            },
          })}
        />
        <TextField
          label="When it ran"
          type="datetime-local"
          error={errors.testedAt?.message}
          {...register('testedAt')}
        />
        <RadioGroupField
          label="What the sheet shows"
          className="sm:col-span-2"
          options={[
            { value: 'passed', label: 'Passed', note: 'Turned evenly, the middle like the edge.' },
            { value: 'failed', label: 'Failed', note: 'Lighter in the middle, or in patches: air was left.' },
          ]}
          error={errors.result?.message}
          {...register('result')}
        />
        {result === 'failed' && (
          <CheckboxField
            label={`Take ${chosen?.code ?? 'the sterilizer'} out of service with it`}
            hint="No load of it can be closed until an engineer or supervisor puts it back."
            className="bg-madder-1 px-4 py-1 shadow-[inset_5px_0_0_var(--color-madder-3)] sm:col-span-2"
            {...register('isTakenOutOfService')}
          />
        )}
        <TextField label="Lot of the test pack" isCode error={errors.packLot?.message} {...register('packLot')} />
        <TextField
          label="The pack expires on"
          type="date"
          error={errors.packExpiresOn?.message}
          {...register('packExpiresOn')}
        />
        <CheckboxField
          label="Before the first load of the day"
          className="self-end"
          {...register('isBeforeFirstLoad')}
        />
        <SelectField
          label="Second reader, where in doubt"
          isOptional
          options={[
            { value: '', label: 'Nobody' },
            ...readers
              .filter((reader) => reader.id !== person.id)
              .map((reader) => ({ value: reader.id, label: reader.name })),
          ]}
          error={errors.secondReaderId?.message}
          {...register('secondReaderId')}
        />
        <TextField
          label="Remark"
          isOptional
          className="sm:col-span-2"
          error={errors.note?.message}
          {...register('note')}
        />
      </div>
      <p role="alert" className={refusal === null ? 'sr-only' : 'font-semibold text-madder-3'}>
        {refusal === null ? null : sentenceOf(refusal)}
      </p>
      <div className="flex flex-wrap items-center gap-3">
        <Button
          type="submit"
          size="large"
          kind={result === 'failed' ? 'stop' : 'film'}
          waitingWords={record.isPending ? 'Writing it down' : undefined}
        >
          Write it down
        </Button>
        <p className="text-small text-ink-2">In the name of {person.displayName}.</p>
      </div>
      {record.isSuccess && (
        <p role="status" className="text-row font-semibold text-film-5">
          {record.data.test.sterilizer.code}: {record.data.test.result}, written down.
          {record.data.serviceState === 'out-of-service' && ' It is out of service.'}
        </p>
      )}
    </form>
  );
}
