import { useId, useState, type ReactNode } from 'react';
import { sentenceOf } from '../../lib/errors';
import { Button } from './button';
import { Dialog } from './dialog';
import { TextAreaField } from './text-field';

export type ConfirmDialogProps = {
  isOpen: boolean;
  onClose: () => void;
  /** A question: "Take this package off the load?" */
  title: string;
  /** What will happen, in one or two sentences. */
  children: ReactNode;
  /** The act itself, as a verb: "Take it off". Never "OK". */
  confirmWords: string;
  /** While it is done: "Taking it off". */
  waitingWords: string;
  kind?: 'film' | 'stop';
  /** Asks for a written reason. */
  reason?: {
    readonly label: string;
    readonly hint?: string;
    readonly isNeeded: boolean;
    readonly greatestLength?: number;
  };
  /** Gets the reason, trimmed; empty when none was asked for. The dialog closes when it is done and says what went wrong otherwise. */
  onConfirm: (reason: string) => Promise<void>;
};

/** Asks before something that others will notice. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  // Mounted anew at each opening, so that no reason of the last time is left in it.
  return props.isOpen ? <OpenConfirmDialog {...props} /> : null;
}

function OpenConfirmDialog({
  onClose,
  title,
  children,
  confirmWords,
  waitingWords,
  kind = 'film',
  reason,
  onConfirm,
}: ConfirmDialogProps) {
  const formId = useId();
  const [text, setText] = useState('');
  const [isMissing, setIsMissing] = useState(false);
  const [isWaiting, setIsWaiting] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);

  async function confirm() {
    const given = text.trim();
    if (reason?.isNeeded === true && given === '') {
      setIsMissing(true);
      document.getElementById(formId)?.querySelector('textarea')?.focus();
      return;
    }
    setIsWaiting(true);
    setRefusal(null);
    try {
      await onConfirm(given);
      onClose();
    } catch (error) {
      setRefusal(sentenceOf(error));
      setIsWaiting(false);
    }
  }

  return (
    <Dialog
      isOpen
      role="alertdialog"
      onClose={isWaiting ? undefined : onClose}
      title={title}
      actions={
        <>
          <Button
            kind={kind}
            waitingWords={isWaiting ? waitingWords : undefined}
            onPress={() => {
              void confirm();
            }}
          >
            {confirmWords}
          </Button>
          <Button kind="quiet" onPress={onClose} blockedBecause={isWaiting ? 'It is being done now.' : undefined}>
            Leave it
          </Button>
        </>
      }
    >
      <div id={formId} className="grid gap-4">
        <div className="text-body">{children}</div>
        {reason && (
          <TextAreaField
            label={reason.label}
            {...(reason.hint === undefined ? {} : { hint: reason.hint })}
            isOptional={!reason.isNeeded}
            error={isMissing && text.trim() === '' ? 'Write the reason in a few words.' : undefined}
            maxLength={reason.greatestLength ?? 500}
            value={text}
            onChange={(event) => {
              setText(event.target.value);
            }}
          />
        )}
        <p role="alert" className={refusal === null ? 'sr-only' : 'text-row font-semibold text-madder-3'}>
          {refusal}
        </p>
      </div>
    </Dialog>
  );
}
