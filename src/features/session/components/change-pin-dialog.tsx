import { changePinRequestSchema } from '#contract/session';
import { leastPinLength } from '#domain/people/pin-policy';
import { zodResolver } from '@hookform/resolvers/zod';
import { useId } from 'react';
import { useForm } from 'react-hook-form';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { PasswordField } from '../../../components/ui/password-field';
import { fieldNameOf, isProblem, sentenceOf } from '../../../lib/errors';
import { useChangePin } from '../mutations';

const formNames = ['password', 'pin'] as const;

/** A PIN of one's own, to go with the badge. */
export function ChangePinDialog({ isOpen, onClose }: { isOpen: boolean; onClose: () => void }) {
  return isOpen ? <OpenChangePinDialog onClose={onClose} /> : null;
}

function OpenChangePinDialog({ onClose }: { onClose: () => void }) {
  const formId = useId();
  const announce = useAnnounce();
  const change = useChangePin();
  const { register, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(changePinRequestSchema),
    defaultValues: { password: '', pin: '' },
  });
  const submit = handleSubmit((values) => {
    change.mutate(values, {
      onSuccess: () => {
        announce('The new PIN is kept.');
        onClose();
      },
      onError: (error) => {
        if (!isProblem(error)) return;
        for (const { pointer, detail } of error.fields) {
          const name = formNames.find((known) => known === fieldNameOf(pointer));
          if (name) setError(name, { message: detail }, { shouldFocus: true });
        }
      },
    });
  });
  const isAtField = isProblem(change.error) && change.error.fields.length > 0;
  const refusal = change.isError && !isAtField ? sentenceOf(change.error) : null;
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="PIN for your badge"
      actions={
        <>
          <Button type="submit" form={formId} waitingWords={change.isPending ? 'Keeping it' : undefined}>
            Keep this PIN
          </Button>
          <Button kind="quiet" onPress={onClose}>
            Leave it
          </Button>
        </>
      }
    >
      <form id={formId} onSubmit={submit} noValidate className="grid gap-5">
        <PasswordField
          label="Your password"
          autoComplete="current-password"
          error={formState.errors.password?.message}
          {...register('password')}
        />
        <PasswordField
          label="New PIN"
          hint={`${leastPinLength} digits or more, no row like 123456.`}
          inputMode="numeric"
          autoComplete="off"
          error={formState.errors.pin?.message}
          {...register('pin')}
        />
        <p role="alert" className={refusal === null ? 'sr-only' : 'font-semibold text-madder-3'}>
          {refusal}
        </p>
      </form>
    </Dialog>
  );
}
