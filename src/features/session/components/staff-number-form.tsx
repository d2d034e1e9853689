import type { SessionResponse } from '#contract/session';
import { signInRequestSchema } from '#contract/session';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/ui/button';
import { PasswordField } from '../../../components/ui/password-field';
import { TextField } from '../../../components/ui/text-field';
import { sentenceOf } from '../../../lib/errors';
import { useSignIn } from '../mutations';

type StaffNumberFormProps = {
  onSignedIn: (session: SessionResponse) => void;
};

/** Signing in by hand. */
export function StaffNumberForm({ onSignedIn }: StaffNumberFormProps) {
  const signIn = useSignIn();
  const { register, handleSubmit, formState, resetField, setFocus } = useForm({
    resolver: zodResolver(signInRequestSchema),
    defaultValues: { staffNumber: '', password: '' },
  });
  const submit = handleSubmit((values) => {
    signIn.mutate(
      { by: 'staff-number', ...values },
      {
        onSuccess: onSignedIn,
        onError: () => {
          resetField('password');
          setFocus('password');
        },
      },
    );
  });
  return (
    <form onSubmit={submit} noValidate className="grid gap-5">
      <TextField
        label="Staff number"
        isCode
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        // A badge scanned here is read as a badge, not written into the field.
        data-scan="yes"
        error={formState.errors.staffNumber?.message}
        {...register('staffNumber')}
      />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={formState.errors.password?.message}
        {...register('password')}
      />
      <p role="alert" className={signIn.isError ? '-mt-1 font-semibold text-madder-3' : 'sr-only'}>
        {signIn.isError ? sentenceOf(signIn.error) : ''}
      </p>
      <Button type="submit" size="large" waitingWords={signIn.isPending ? 'Signing in' : undefined}>
        Sign in
      </Button>
    </form>
  );
}
