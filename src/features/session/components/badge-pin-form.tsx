import { greatestPinLength, leastPinLength } from '#domain/people/pin-policy';
import type { SessionResponse } from '#contract/session';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { PinPad } from '../../../components/ui/key-pad';
import { sentenceOf } from '../../../lib/errors';
import { useSignIn } from '../mutations';

type BadgePinFormProps = {
  badge: string;
  onSignedIn: (session: SessionResponse) => void;
  onBack: () => void;
};

/** The badge has been read; its PIN makes it a sign-in. */
export function BadgePinForm({ badge, onSignedIn, onBack }: BadgePinFormProps) {
  const signIn = useSignIn();
  return (
    <div className="grid gap-4">
      <div className="flex items-center gap-4">
        <span className="weld grid h-14 w-14 flex-none place-items-center">
          <Icon name="tick" size={30} />
        </span>
        <div className="flex-1">
          <h2 className="text-say">Badge read</h2>
          <p className="text-row text-ink-2">Now its PIN.</p>
        </div>
        <Button kind="plain" size="small" onPress={onBack}>
          Not mine
        </Button>
      </div>
      <PinPad
        label="PIN"
        error={signIn.isError ? sentenceOf(signIn.error) : undefined}
        doneWords="Sign in"
        waitingWords={signIn.isPending ? 'Signing in' : undefined}
        leastDigits={leastPinLength}
        mostDigits={greatestPinLength}
        onDone={(pin) => {
          signIn.mutate({ by: 'badge', badge, pin }, { onSuccess: onSignedIn });
        }}
      />
    </div>
  );
}
