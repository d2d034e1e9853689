import { serviceStateWords } from '#domain/catalogue/service-state-words';
import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { SelectField } from '../../../components/ui/select-field';
import { WaitingState, WrongState } from '../../../components/ui/states';
import { TextField } from '../../../components/ui/text-field';
import { sentenceOf } from '../../../lib/errors';
import { useFacility } from '../../../lib/facility';
import { newRequestId } from '../../../lib/request-id';
import { serverNow } from '../../../lib/server-clock';
import { useAddRun } from '../mutations';
import { runQueries } from '../queries';
import { runNameSchema, wantedTimeSchema } from '../run-form';
import { timeOfText, wantedAtOf } from '../wanted-at';

const formSchema = z.object({
  name: runNameSchema,
  sterilizerId: z.string(),
  programId: z.string(),
  wanted: wantedTimeSchema,
});
type Form = z.infer<typeof formSchema>;

/** A run to be filled: its name, and as much about its sterilizer and hour as is known. */
export function NewRunSheet({ onClose, onAdded }: { onClose: () => void; onAdded: (runId: string) => void }) {
  const equipment = useQuery(runQueries.equipment());
  return (
    <Dialog isOpen onClose={onClose} title="New run" material="film">
      {equipment.data ? (
        <NewRunForm equipment={equipment.data} onAdded={onAdded} />
      ) : equipment.isError ? (
        <WrongState
          title="The sterilizers did not come"
          error={equipment.error}
          onTryAgain={() => {
            void equipment.refetch();
          }}
        />
      ) : (
        <WaitingState title="Fetching sterilizers" waitsFor="The server has not answered yet." />
      )}
    </Dialog>
  );
}

type Equipment = Awaited<ReturnType<NonNullable<ReturnType<typeof runQueries.equipment>['queryFn']>>>;

function NewRunForm({ equipment, onAdded }: { equipment: Equipment; onAdded: (runId: string) => void }) {
  const { timeZone } = useFacility();
  const addRun = useAddRun();
  const [requestId, setRequestId] = useState(newRequestId);
  const form = useForm<Form>({
    resolver: zodResolver(formSchema),
    defaultValues: { name: '', sterilizerId: '', programId: '', wanted: '' },
  });
  const { errors } = form.formState;
  const sterilizerId = useWatch({ control: form.control, name: 'sterilizerId' });
  const sterilizer = equipment.sterilizers.find((one) => one.id === sterilizerId);
  const programs = equipment.programs.filter(
    (program) => sterilizer === undefined || sterilizer.qualifiedPrograms.includes(program.code),
  );

  async function send({ name, wanted, ...chosen }: Form) {
    const time = timeOfText(wanted);
    const { runId } = await addRun.mutateAsync({
      requestId,
      name,
      sterilizerId: chosen.sterilizerId || null,
      programId: chosen.programId || null,
      wantedAt: time === null ? null : wantedAtOf(time, serverNow(), timeZone),
    });
    onAdded(runId);
  }

  return (
    <form
      className="grid gap-4 tablet:grid-cols-2"
      onChange={() => {
        setRequestId(newRequestId());
      }}
      onSubmit={(event) => {
        void form
          .handleSubmit(send)(event)
          .catch(() => undefined);
      }}
    >
      <TextField
        label="Name"
        className="tablet:col-span-2"
        placeholder="Room 4, first list"
        maxLength={80}
        autoFocus
        error={errors.name?.message}
        {...form.register('name')}
      />
      <SelectField
        label="Sterilizer"
        isOptional
        placeholder="Any"
        options={equipment.sterilizers.map((one) => ({
          value: one.id,
          label:
            one.serviceState === 'in-service'
              ? one.name
              : `${one.name}, ${serviceStateWords[one.serviceState].toLowerCase()}`,
          isDisabled: one.serviceState !== 'in-service',
        }))}
        {...form.register('sterilizerId', {
          onChange: () => {
            // Another sterilizer may not be qualified for it.
            form.setValue('programId', '');
          },
        })}
      />
      <SelectField
        label="Program"
        isOptional
        placeholder="Chosen with the load"
        options={programs.map((program) => ({ value: program.id, label: program.name }))}
        {...form.register('programId')}
      />
      <TextField
        label="Wanted for"
        isOptional
        placeholder="14:30"
        maxLength={5}
        error={errors.wanted?.message}
        {...form.register('wanted')}
      />
      <p
        role="alert"
        className={
          addRun.isError ? 'text-row font-semibold text-madder-3 tablet:col-span-2' : 'sr-only tablet:col-span-2'
        }
      >
        {addRun.isError ? sentenceOf(addRun.error) : ''}
      </p>
      <Button
        type="submit"
        className="tablet:col-span-2"
        waitingWords={addRun.isPending ? 'Making the run' : undefined}
      >
        Make the run
      </Button>
    </form>
  );
}
