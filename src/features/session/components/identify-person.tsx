import { parseBadgeCode } from '#domain/label/badge-code';
import { greatestPinLength, leastPinLength } from '#domain/people/pin-policy';
import type { SessionResponse } from '#contract/session';
import { useState } from 'react';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { sentenceOf } from '../../../lib/errors';
import { LazyCameraScanner } from '../../../lib/lazy-camera-scanner';
import { useScanner, type Scan, type ScanLayer } from '../../../lib/scanner-input';
import { useSignIn } from '../mutations';
import { BadgePinForm } from './badge-pin-form';
import { StaffNumberForm } from './staff-number-form';

const pinShape = new RegExp(`^[0-9]{${leastPinLength},${greatestPinLength}}$`);

type IdentifyPersonProps = {
  layer: ScanLayer;
  /** A badge that was scanned before this was on screen. */
  firstBadge?: string | null;
  onSignedIn: (session: SessionResponse) => void;
};

/** Who is there? By badge and PIN, or by hand. */
export function IdentifyPerson({ layer, firstBadge = null, onSignedIn }: IdentifyPersonProps) {
  const [badge, setBadge] = useState(firstBadge);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [isCameraOn, setIsCameraOn] = useState(false);

  const signIn = useSignIn();

  function tryPin(pin: string) {
    if (badge !== null && !signIn.isPending) {
      signIn.mutate({ by: 'badge', badge, pin }, { onSuccess: onSignedIn });
    }
  }

  function askForPinOf(next: string | null) {
    signIn.reset();
    setBadge(next);
  }

  function take(scan: Scan) {
    // Fingers that know their PIN are as quick as a scanner.
    if (badge !== null && scan.entry === 'wedge' && pinShape.test(scan.text)) {
      tryPin(scan.text);
      return;
    }
    const read = parseBadgeCode(scan.text);
    if (read.ok) {
      askForPinOf(read.value.code);
      setRefusal(null);
      setIsCameraOn(false);
    } else setRefusal(read.refusal.sentence);
  }

  useScanner(take, { layer });

  return (
    <div className="grid gap-5">
      <p role="alert" className={refusal === null ? 'sr-only' : 'bg-madder-1 px-4 py-3 font-semibold text-madder-3'}>
        {refusal}
      </p>
      {badge === null ? (
        <>
          <BadgePrompt
            isCameraOn={isCameraOn}
            onCamera={() => {
              setIsCameraOn(!isCameraOn);
            }}
          />
          {isCameraOn && <LazyCameraScanner onScan={take} />}
          <p className="grid grid-cols-[1fr_auto_1fr] items-center gap-3.5 text-row text-ink-2">
            <span className="ribs h-[7px]" />
            or by hand
            <span className="ribs h-[7px]" />
          </p>
          <StaffNumberForm onSignedIn={onSignedIn} />
        </>
      ) : (
        <BadgePinForm
          key={badge}
          isWaiting={signIn.isPending}
          error={signIn.isError ? sentenceOf(signIn.error) : undefined}
          onPin={tryPin}
          onBack={() => {
            askForPinOf(null);
          }}
        />
      )}
    </div>
  );
}

function BadgePrompt({ isCameraOn, onCamera }: { isCameraOn: boolean; onCamera: () => void }) {
  return (
    <div className="grid grid-cols-[4.75rem_1fr] items-center gap-4.5 tablet:py-2">
      <span className="relative grid h-24 w-19 place-items-center bg-paper-0 shadow-[inset_0_0_0_1.5px_var(--color-ink-1)] before:absolute before:top-[7px] before:h-[5px] before:w-[26px] before:rounded before:bg-ink-1">
        <Icon name="scan" size={40} />
      </span>
      <div>
        <h2 className="text-title font-semibold">Scan your badge</h2>
        <p className="text-[1.0625rem]/[1.4375rem] text-ink-2">The scanner on this tablet is ready.</p>
        <Button kind="plain" size="small" icon="camera" className="-ml-3" aria-pressed={isCameraOn} onPress={onCamera}>
          {isCameraOn ? 'Turn the camera off' : 'Use the camera'}
        </Button>
      </div>
    </div>
  );
}
