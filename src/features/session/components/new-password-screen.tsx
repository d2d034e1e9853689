import { leastPasswordLength } from '#domain/people/password-policy';
import { changePasswordRequestSchema } from '#contract/session';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Mark } from '../../../components/mark';
import { Button } from '../../../components/ui/button';
import { FilmPanel } from '../../../components/ui/film-panel';
import { PasswordField } from '../../../components/ui/password-field';
import { fieldNameOf, isProblem, sentenceOf } from '../../../lib/errors';
import { useChangePassword, useSignOut } from '../mutations';

type NewPasswordScreenProps = {
  personName: string;
  /** one-time: it was given out and has to go. own: the person wants another. */
  because: 'one-time' | 'own';
  onDone: () => void;
  /** Back to where the person was, or to the sign-in screen. */
  onLeave: () => void;
};

const formNames = ['current', 'next'] as const;

/** A password of one's own, in place of the one-time one. */
export function NewPasswordScreen({ personName, because, onDone, onLeave }: NewPasswordScreenProps) {
  const change = useChangePassword();
  const signOut = useSignOut();
  const { register, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(changePasswordRequestSchema),
    defaultValues: { current: '', next: '' },
  });
  const isOneTime = because === 'one-time';
  const submit = handleSubmit((values) => {
    change.mutate(values, {
      onSuccess: onDone,
      onError: (error) => {
        if (!isProblem(error)) return;
        for (const { pointer, detail } of error.fields) {
          const name = formNames.find((known) => known === fieldNameOf(pointer));
          if (name) setError(name, { message: detail }, { shouldFocus: true });
        }
      },
    });
  });
  // What belongs to a field stands at the field.
  const isAtField = isProblem(change.error) && change.error.fields.length > 0;
  const refusal = change.isError && !isAtField ? sentenceOf(change.error) : null;
  return (
    <div className="bg-fibre grid h-full content-start justify-items-center overflow-auto bg-paper-1 tablet:content-center">
      <title>New password · Paperside</title>
      <FilmPanel className="w-full max-w-[33rem]">
        <main className="grid gap-5 px-6 pt-8 pb-7">
          <div className="flex items-center gap-3.5">
            <Mark size={40} />
            <h1 className="text-title">{isOneTime ? 'Choose your own password' : 'Change your password'}</h1>
          </div>
          <p className="text-ink-2">
            {isOneTime
              ? `${personName}, the password you signed in with was good for once. Yours is known to nobody else.`
              : `${personName}, you stay signed in here. Everywhere else you sign in anew.`}
          </p>
          <form onSubmit={submit} noValidate className="grid gap-5">
            <PasswordField
              label={isOneTime ? 'One-time password' : 'Password now'}
              autoComplete="current-password"
              error={formState.errors.current?.message}
              {...register('current')}
            />
            <PasswordField
              label="New password"
              hint={`${leastPasswordLength} characters or more. A few words in a row are good; capitals and signs are not needed.`}
              autoComplete="new-password"
              error={formState.errors.next?.message}
              {...register('next')}
            />
            <p role="alert" className={refusal === null ? 'sr-only' : 'font-semibold text-madder-3'}>
              {refusal}
            </p>
            <div className="flex flex-wrap gap-2.5">
              <Button type="submit" size="large" waitingWords={change.isPending ? 'Keeping it' : undefined}>
                Keep this password
              </Button>
              <Button
                kind="quiet"
                size="large"
                onPress={() => {
                  if (isOneTime) signOut.mutate('here', { onSettled: onLeave });
                  else onLeave();
                }}
              >
                {isOneTime ? 'Sign out' : 'Leave it'}
              </Button>
            </div>
          </form>
        </main>
      </FilmPanel>
    </div>
  );
}
