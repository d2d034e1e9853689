import { useId, useRef, useState, type ReactNode } from 'react';
import { Icon } from '../icon';
import { Button } from './button';
import { describedBy, FieldError } from './field';

const digits = ['1', '2', '3', '4', '5', '6', '7', '8', '9'] as const;

/** Big digits for gloved hands. */
export function KeyPad({
  onDigit,
  onBack,
  onClear,
}: {
  onDigit: (digit: string) => void;
  onBack: () => void;
  onClear: () => void;
}) {
  const key = 'min-h-15 w-full text-say bg-paper-0';
  return (
    <div role="group" aria-label="Digits" className="grid grid-cols-3 gap-2">
      {digits.map((digit) => (
        <Button
          key={digit}
          kind="quiet"
          className={key}
          onPress={() => {
            onDigit(digit);
          }}
        >
          {digit}
        </Button>
      ))}
      <Button kind="plain" className="min-h-15 w-full" onPress={onClear}>
        Clear
      </Button>
      <Button
        kind="quiet"
        className={key}
        onPress={() => {
          onDigit('0');
        }}
      >
        0
      </Button>
      <Button kind="plain" className="min-h-15 w-full" aria-label="Take the last digit back" onPress={onBack}>
        <Icon name="back" size={26} />
      </Button>
    </div>
  );
}

type PadFieldProps = {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  value: string;
  onChange: (digits: string) => void;
  /** Enter on a keyboard. */
  onEnter: () => void;
  mostDigits: number;
  isSecret?: boolean;
  autoFocus?: boolean;
};

/**
 * A field of digits with its pad. A keyboard can write in it too; a scan made meanwhile goes to the scanner's handler,
 * and `inputMode` keeps the tablet's own keyboard away.
 */
function PadField({
  label,
  hint,
  error,
  value,
  onChange,
  onEnter,
  mostDigits,
  isSecret = false,
  autoFocus = false,
}: PadFieldProps) {
  const id = useId();
  const field = useRef<HTMLInputElement>(null);
  const take = (text: string) => {
    onChange(text.replaceAll(/\D/g, '').slice(0, mostDigits));
  };
  return (
    <div className="grid gap-3">
      <div>
        <label htmlFor={id} className="mb-2 block text-small font-medium">
          {label}
        </label>
        {hint !== undefined && (
          <p id={`${id}-hint`} className="mb-1.5 text-small text-ink-2">
            {hint}
          </p>
        )}
        <input
          ref={field}
          id={id}
          type={isSecret ? 'password' : 'text'}
          inputMode="none"
          autoComplete="off"
          data-scan="yes"
          // The pad is the only thing to do here, and keyboards start on it.
          autoFocus={autoFocus}
          aria-describedby={describedBy(id, { hint, error })}
          aria-invalid={error === undefined ? undefined : true}
          value={value}
          onChange={(event) => {
            take(event.target.value);
          }}
          onKeyDown={(event) => {
            if (event.key !== 'Enter') return;
            event.preventDefault();
            onEnter();
          }}
          className="written-line block h-14 w-full border-0 px-4 text-clock tracking-[0.12em] tabular-nums"
        />
        <FieldError id={`${id}-error`} error={error} />
      </div>
      <KeyPad
        onDigit={(digit) => {
          take(value + digit);
        }}
        onBack={() => {
          onChange(value.slice(0, -1));
        }}
        onClear={() => {
          onChange('');
        }}
      />
    </div>
  );
}

type PinPadProps = {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  doneWords: string;
  waitingWords?: string | undefined;
  onDone: (pin: string) => void;
  leastDigits?: number;
  mostDigits?: number;
};

/** The PIN that goes with a badge. Empties itself after each try. */
export function PinPad({
  label,
  hint,
  error,
  doneWords,
  waitingWords,
  onDone,
  leastDigits = 4,
  mostDigits = 12,
}: PinPadProps) {
  const [pin, setPin] = useState('');
  const isShort = pin.length < leastDigits;
  function done() {
    if (isShort || waitingWords !== undefined) return;
    setPin('');
    onDone(pin);
  }
  return (
    <div className="grid gap-4">
      <PadField
        label={label}
        {...(hint === undefined ? {} : { hint })}
        error={error}
        value={pin}
        onChange={setPin}
        onEnter={done}
        mostDigits={mostDigits}
        isSecret
        autoFocus
      />
      <Button
        size="large"
        onPress={done}
        waitingWords={waitingWords}
        blockedBecause={isShort && waitingWords === undefined ? `A PIN has ${leastDigits} digits or more.` : undefined}
      >
        {doneWords}
      </Button>
    </div>
  );
}

type CountPadProps = {
  /** "Pieces on shelf 2" */
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  doneWords: string;
  waitingWords?: string | undefined;
  onDone: (count: number) => void;
  mostDigits?: number;
};

/** A blind count: nothing here shows what was scanned. */
export function CountPad({ label, hint, error, doneWords, waitingWords, onDone, mostDigits = 4 }: CountPadProps) {
  const [text, setText] = useState('');
  const isEmpty = text === '';
  function done() {
    if (isEmpty || waitingWords !== undefined) return;
    onDone(Number(text));
  }
  return (
    <div className="grid gap-4">
      <PadField
        label={label}
        {...(hint === undefined ? {} : { hint })}
        error={error}
        value={text}
        onChange={setText}
        onEnter={done}
        mostDigits={mostDigits}
        autoFocus
      />
      <Button
        size="large"
        onPress={done}
        waitingWords={waitingWords}
        blockedBecause={
          isEmpty && waitingWords === undefined ? 'Type what you counted. Nothing there is 0.' : undefined
        }
      >
        {doneWords}
      </Button>
    </div>
  );
}
