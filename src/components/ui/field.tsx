import { useId, type ReactNode } from 'react';

/** What every field has; the control itself is handed the attributes that tie the words to it. */
export type FieldWords = {
  label: string;
  /** One sentence under the label: what is wanted, and how. */
  hint?: ReactNode;
  /** What is wrong with what was written, and what would be right. */
  error?: string | undefined;
  isOptional?: boolean;
  /** The label is still read by screen readers. Only where the screen around it says the same. */
  isLabelHidden?: boolean;
};

export type FieldControl = {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
};

/** The ids of those words that are there, as `aria-describedby` wants them. */
export function describedBy(id: string, { hint, error }: Pick<FieldWords, 'hint' | 'error'>): string | undefined {
  const ids = [hint !== undefined && `${id}-hint`, error !== undefined && `${id}-error`].filter((one) => one !== false);
  return ids.length === 0 ? undefined : ids.join(' ');
}

type FieldProps = FieldWords & {
  className?: string;
  children: (control: FieldControl) => ReactNode;
};

/** Label, hint and error of one control, tied to it for screen readers. */
export function Field({
  label,
  hint,
  error,
  isOptional = false,
  isLabelHidden = false,
  className = '',
  children,
}: FieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label htmlFor={id} className={isLabelHidden ? 'sr-only' : 'mb-1 block text-small font-medium'}>
        {label}
        {isOptional && <span className="font-normal text-ink-2"> (may stay empty)</span>}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-1.5 text-small text-ink-2">
          {hint}
        </p>
      )}
      {children({
        id,
        'aria-describedby': describedBy(id, { hint, error }),
        'aria-invalid': error === undefined ? undefined : true,
      })}
      <FieldError id={`${id}-error`} error={error} />
    </div>
  );
}

/** Stays in place when empty, so that its words are read out as they come. */
export function FieldError({ id, error }: { id: string; error: string | undefined }) {
  return (
    <p
      id={id}
      aria-live="polite"
      className={error === undefined ? 'sr-only' : 'mt-1.5 text-small font-semibold text-madder-3'}
    >
      {error}
    </p>
  );
}

export const controlLook =
  'written-line block w-full min-h-12 px-3.5 font-medium text-[1rem]/[1.25rem] text-ink-1 border-0 appearance-none';
