import { useState } from 'react';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { DateText } from '../../../components/ui/time';

export type ShownOnce = {
  readonly what: 'one-time-password' | 'pin';
  readonly personName: string;
  readonly staffNumber: string;
  /** null: the answer came a second time, and it is not shown again. */
  readonly secret: string | null;
  readonly expiresAt: string | null;
};

const words = {
  'one-time-password': {
    title: (name: string) => `One-time password for ${name}`,
    use: 'It is typed once, at the next sign-in, and a password of their own takes its place.',
  },
  pin: {
    title: (name: string) => `PIN for the badge of ${name}`,
    use: 'They can choose one of their own, under their name.',
  },
} as const;

/** A secret that this screen alone has, and only now. */
export function ShownOnceDialog({ shown, onClose }: { shown: ShownOnce | null; onClose: () => void }) {
  return shown === null ? null : <OpenShownOnceDialog shown={shown} onClose={onClose} />;
}

function OpenShownOnceDialog({ shown, onClose }: { shown: ShownOnce; onClose: () => void }) {
  const { what, personName, staffNumber, secret, expiresAt } = shown;
  const [copied, setCopied] = useState<'not-yet' | 'yes' | 'not-possible'>('not-yet');
  if (secret === null) {
    return (
      <Dialog
        isOpen
        onClose={onClose}
        title="Given out, but not shown"
        actions={<Button onPress={onClose}>Close</Button>}
      >
        <p>
          The answer got lost on its way here the first time, and it is shown only once. The old one no longer opens
          anything. Give out a new one.
        </p>
      </Dialog>
    );
  }

  async function copy(text: string) {
    setCopied((await copyText(text)) ? 'yes' : 'not-possible');
  }

  return (
    <Dialog
      // No way out beside the button: a touch beside the sheet must not lose what is shown only now.
      isOpen
      title={words[what].title(personName)}
      actions={
        <>
          <Button onPress={onClose}>I have passed it on</Button>
          <Button
            kind="quiet"
            onPress={() => {
              void copy(secret);
            }}
          >
            Copy
          </Button>
        </>
      }
    >
      <p>
        Shown only now. Staff number <span className="code">{staffNumber}</span>. {words[what].use}
      </p>
      <p className="code my-4 bg-film-1 px-4 py-5 text-center text-scan break-words select-all">{secret}</p>
      {expiresAt !== null && (
        <p className="text-ink-2">
          Opens until <DateText at={expiresAt} form="with-time" />.
        </p>
      )}
      <p role="status" className="mt-2 min-h-5 text-small font-semibold">
        {copied === 'yes' && 'Copied. Clear the clipboard when it is passed on.'}
        {copied === 'not-possible' && 'This tablet does not copy here. Write it down.'}
      </p>
    </Dialog>
  );
}

/** Pages on plain http have no clipboard: MDN, Clipboard, secure contexts (from memory). */
async function copyText(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return false;
  }
}
