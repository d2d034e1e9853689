import { greatestPinLength, leastPinLength } from '#domain/people/pin-policy';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { PinPad } from '../../../components/ui/key-pad';

type BadgePinFormProps = {
  onPin: (pin: string) => void;
  onBack: () => void;
  isWaiting: boolean;
  error: string | undefined;
};

/** The badge has been read; its PIN makes it a sign-in. */
export function BadgePinForm({ onPin, onBack, isWaiting, error }: BadgePinFormProps) {
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
        <Button kind="plain" size="small" className="-mr-3" onPress={onBack}>
          Not mine
        </Button>
      </div>
      <PinPad
        label="PIN"
        error={error}
        doneWords="Sign in"
        waitingWords={isWaiting ? 'Signing in' : undefined}
        leastDigits={leastPinLength}
        mostDigits={greatestPinLength}
        onDone={onPin}
      />
    </div>
  );
}
