import { zodResolver } from '@hookform/resolvers/zod';
import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { useWrite } from '../../../components/stock/use-write';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { SegmentedChoice } from '../../../components/ui/segmented-choice';
import { TextField } from '../../../components/ui/text-field';
import { useFacility } from '../../../lib/facility';
import { useAddPerson, useJoinPerson } from '../mutations';
import { joiningPersonSchema, newPersonSchema } from '../person-form';
import { initialsFor } from '../person-words';
import { EnterSends, PlaceFields, Refusal, sendForm, showAtFields } from './form-parts';
import type { ShownOnce } from './shown-once-dialog';

type AddPersonDialogProps = {
  isOpen: boolean;
  onClose: () => void;
  onAdded: (added: { readonly personId: string; readonly shown: ShownOnce | null }) => void;
};

/** Makes somebody a person of this place. */
export function AddPersonDialog(props: AddPersonDialogProps) {
  // Mounted anew at each opening, so that nothing of the last person is left in it.
  return props.isOpen ? <OpenAddPersonDialog {...props} /> : null;
}

function OpenAddPersonDialog({ onClose, onAdded }: AddPersonDialogProps) {
  const [who, setWho] = useState<'new' | 'joining'>('new');
  const formId = useId();
  const [isWaiting, setIsWaiting] = useState(false);
  return (
    <Dialog
      isOpen
      onClose={isWaiting ? undefined : onClose}
      title="Add a person"
      actions={
        <>
          <Button
            onPress={() => {
              sendForm(formId);
            }}
            waitingWords={isWaiting ? 'Adding' : undefined}
          >
            {who === 'new' ? 'Add and give a one-time password' : 'Let them work here'}
          </Button>
          <Button kind="quiet" onPress={onClose} blockedBecause={isWaiting ? 'It is being done now.' : undefined}>
            Leave it
          </Button>
        </>
      }
    >
      <SegmentedChoice
        label="Where from"
        value={who}
        onChange={setWho}
        options={[
          { value: 'new', label: 'New' },
          { value: 'joining', label: 'From another facility' },
        ]}
        className="mt-2 mb-5"
      />
      {who === 'new' ? (
        <NewPersonForm formId={formId} onWaiting={setIsWaiting} onAdded={onAdded} />
      ) : (
        <JoiningPersonForm formId={formId} onWaiting={setIsWaiting} onAdded={onAdded} />
      )}
    </Dialog>
  );
}

type FormProps = {
  formId: string;
  onWaiting: (isWaiting: boolean) => void;
  onAdded: AddPersonDialogProps['onAdded'];
};

const newNames = ['staffNumber', 'displayName', 'initials', 'role', 'usualShift', 'expiresAt'] as const;

function NewPersonForm({ formId, onWaiting, onAdded }: FormProps) {
  const { name: facilityName, timeZone } = useFacility();
  const add = useAddPerson();
  const write = useWrite();
  const { register, handleSubmit, formState, setError, getValues, setValue } = useForm({
    resolver: zodResolver(newPersonSchema(timeZone)),
    defaultValues: { staffNumber: '', displayName: '', initials: '', usualShift: '', expiresAt: '' },
  });
  const { errors } = formState;
  const submit = handleSubmit(async (values) => {
    onWaiting(true);
    try {
      const reply = await write((requestId) => add.mutateAsync({ ...values, requestId }));
      onAdded({
        personId: reply.person.id,
        shown: {
          what: 'one-time-password',
          personName: reply.person.displayName,
          staffNumber: reply.person.staffNumber,
          secret: reply.oneTimePassword,
          expiresAt: reply.oneTimePasswordExpiresAt,
        },
      });
    } catch (error) {
      showAtFields(error, newNames, setError);
    } finally {
      onWaiting(false);
    }
  });
  return (
    <form id={formId} onSubmit={submit} noValidate className="grid gap-5">
      <TextField label="Staff number" isCode error={errors.staffNumber?.message} {...register('staffNumber')} />
      <TextField
        label="Name"
        error={errors.displayName?.message}
        {...register('displayName', {
          onBlur: () => {
            if (getValues('initials') === '') setValue('initials', initialsFor(getValues('displayName')));
          },
        })}
      />
      <TextField
        label="Initials"
        hint="As they stand on labels and sheets."
        error={errors.initials?.message}
        {...register('initials')}
      />
      <PlaceFields
        role={{ field: register('role'), error: errors.role && 'Choose a role.' }}
        usualShift={{ field: register('usualShift'), error: errors.usualShift?.message }}
        expiresAt={{ field: register('expiresAt'), error: errors.expiresAt?.message }}
        isRoleChosen={false}
        facilityName={facilityName}
      />
      <Refusal error={add.error} />
      <EnterSends />
    </form>
  );
}

const joiningNames = ['staffNumber', 'role', 'usualShift', 'expiresAt'] as const;

function JoiningPersonForm({ formId, onWaiting, onAdded }: FormProps) {
  const { name: facilityName, timeZone } = useFacility();
  const join = useJoinPerson();
  const write = useWrite();
  const { register, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(joiningPersonSchema(timeZone)),
    defaultValues: { staffNumber: '', usualShift: '', expiresAt: '' },
  });
  const { errors } = formState;
  const submit = handleSubmit(async (values) => {
    onWaiting(true);
    try {
      const { person } = await write((requestId) => join.mutateAsync({ ...values, requestId }));
      onAdded({ personId: person.id, shown: null });
    } catch (error) {
      showAtFields(error, joiningNames, setError);
    } finally {
      onWaiting(false);
    }
  });
  return (
    <form id={formId} onSubmit={submit} noValidate className="grid gap-5">
      <TextField
        label="Staff number"
        hint="Of somebody at another facility you administer. Name, password and badge stay theirs."
        isCode
        error={errors.staffNumber?.message}
        {...register('staffNumber')}
      />
      <PlaceFields
        role={{ field: register('role'), error: errors.role && 'Choose a role.' }}
        usualShift={{ field: register('usualShift'), error: errors.usualShift?.message }}
        expiresAt={{ field: register('expiresAt'), error: errors.expiresAt?.message }}
        isRoleChosen={false}
        facilityName={facilityName}
      />
      <Refusal error={join.error} />
      <EnterSends />
    </form>
  );
}
