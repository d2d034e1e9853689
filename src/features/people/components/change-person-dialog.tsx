import type { Person } from '#contract/people';
import { zodResolver } from '@hookform/resolvers/zod';
import { useId, useState } from 'react';
import { useForm } from 'react-hook-form';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { TextField } from '../../../components/ui/text-field';
import { useFacility } from '../../../lib/facility';
import { useChangePerson } from '../mutations';
import { changedPersonSchema, changesBetween, endTextOf } from '../person-form';
import { EnterSends, PlaceFields, Refusal, sendForm, showAtFields } from './form-parts';

type ChangePersonDialogProps = { isOpen: boolean; person: Person; onClose: () => void };

/** Name, role, shift and end of somebody who is here. */
export function ChangePersonDialog(props: ChangePersonDialogProps) {
  return props.isOpen ? <OpenChangePersonDialog {...props} /> : null;
}

const names = ['displayName', 'initials', 'role', 'usualShift', 'expiresAt'] as const;

function OpenChangePersonDialog({ person: current, onClose }: ChangePersonDialogProps) {
  // As it was when it was opened: what somebody else changes meanwhile must not be taken for one's own change.
  const [person] = useState(current);
  const formId = useId();
  const announce = useAnnounce();
  const { name: facilityName, timeZone } = useFacility();
  const change = useChangePerson(person.id);
  const write = useWrite();
  const { register, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(changedPersonSchema(timeZone)),
    defaultValues: {
      displayName: person.displayName,
      initials: person.initials,
      role: person.role,
      usualShift: person.usualShift ?? '',
      expiresAt: endTextOf(person.expiresAt, timeZone),
    },
  });
  const { errors } = formState;
  const submit = handleSubmit(async (values) => {
    const changes = changesBetween(person, values, timeZone);
    if (Object.keys(changes).length === 0) {
      onClose();
      return;
    }
    try {
      await write((requestId) => change.mutateAsync({ requestId, version: person.version, ...changes }));
      announce(`${values.displayName} is changed.`);
      onClose();
    } catch (error) {
      showAtFields(error, names, setError);
    }
  });
  return (
    <Dialog
      isOpen
      onClose={change.isPending ? undefined : onClose}
      title={`Change ${person.displayName}`}
      actions={
        <>
          <Button
            onPress={() => {
              sendForm(formId);
            }}
            waitingWords={change.isPending ? 'Keeping it' : undefined}
          >
            Keep the changes
          </Button>
          <Button
            kind="quiet"
            onPress={onClose}
            blockedBecause={change.isPending ? 'It is being done now.' : undefined}
          >
            Leave it
          </Button>
        </>
      }
    >
      <form id={formId} onSubmit={submit} noValidate className="grid gap-5 pt-2">
        <TextField label="Name" error={errors.displayName?.message} {...register('displayName')} />
        <TextField
          label="Initials"
          hint="As they stand on labels and sheets."
          error={errors.initials?.message}
          {...register('initials')}
        />
        <PlaceFields
          role={{ field: register('role'), error: errors.role?.message }}
          usualShift={{ field: register('usualShift'), error: errors.usualShift?.message }}
          expiresAt={{ field: register('expiresAt'), error: errors.expiresAt?.message }}
          isRoleChosen
          facilityName={facilityName}
        />
        <p className="text-small text-ink-2">A new role or end signs this person out everywhere.</p>
        <Refusal error={change.error} />
        <EnterSends />
      </form>
    </Dialog>
  );
}
