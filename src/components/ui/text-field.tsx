import type { ComponentPropsWithRef, ReactNode } from 'react';
import { controlLook, Field, type FieldWords } from './field';

type InputProps = Omit<ComponentPropsWithRef<'input'>, 'id' | 'className' | 'size'>;

export type TextFieldProps = FieldWords &
  InputProps & {
    /** After the text, such as a unit. */
    suffix?: ReactNode;
    /** A code: its zero is told from an O. */
    isCode?: boolean;
    /** Lets the scanner have what it types here, instead of leaving it in the field. */
    'data-scan'?: 'yes';
    className?: string;
  };

/** One line of text. Takes what `register('name')` of a form gives. */
export function TextField({
  label,
  hint,
  error,
  isOptional,
  isLabelHidden,
  suffix,
  isCode = false,
  className,
  type = 'text',
  ...input
}: TextFieldProps) {
  return (
    <Field {...wordsOf({ label, hint, error, isOptional, isLabelHidden })} {...(className ? { className } : {})}>
      {(control) => (
        <div className="relative">
          <input
            autoComplete="off"
            {...input}
            {...control}
            type={type}
            className={`${controlLook} ${isCode ? 'code' : ''} ${suffix === undefined ? '' : 'pr-16'}`}
          />
          {suffix !== undefined && (
            <span className="pointer-events-none absolute inset-y-0 right-3.5 flex items-center text-body text-ink-2">
              {suffix}
            </span>
          )}
        </div>
      )}
    </Field>
  );
}

/** Leaves out what was not given: under exact optional properties, absent and undefined differ. */
export function wordsOf(words: {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  isOptional?: boolean | undefined;
  isLabelHidden?: boolean | undefined;
}): FieldWords {
  return {
    label: words.label,
    error: words.error,
    ...(words.hint === undefined ? {} : { hint: words.hint }),
    ...(words.isOptional === undefined ? {} : { isOptional: words.isOptional }),
    ...(words.isLabelHidden === undefined ? {} : { isLabelHidden: words.isLabelHidden }),
  };
}

export type NumberFieldProps = Omit<TextFieldProps, 'suffix' | 'type' | 'inputMode' | 'isCode'> & {
  /** Shown after the figure: "mm", "kg", "min". */
  unit?: string;
  /** Whole numbers only: the tablet's keyboard then has no point. */
  isWhole?: boolean;
};

/**
 * A figure. It is text, not a number input: those change under a scroll wheel and swallow a decimal comma.
 * Read it with `readNumber`: `register('massKg', { setValueAs: readNumber })`.
 */
export function NumberField({ unit, isWhole = false, ...field }: NumberFieldProps) {
  return (
    <TextField
      {...field}
      inputMode={isWhole ? 'numeric' : 'decimal'}
      {...(unit === undefined ? {} : { suffix: unit })}
    />
  );
}

export type TextAreaFieldProps = FieldWords &
  Omit<ComponentPropsWithRef<'textarea'>, 'id' | 'className'> & { className?: string };

/** A reason or a remark. */
export function TextAreaField({
  label,
  hint,
  error,
  isOptional,
  isLabelHidden,
  className,
  rows = 3,
  ...textarea
}: TextAreaFieldProps) {
  return (
    <Field {...wordsOf({ label, hint, error, isOptional, isLabelHidden })} {...(className ? { className } : {})}>
      {(control) => (
        <textarea
          {...textarea}
          {...control}
          rows={rows}
          className={`${controlLook} resize-y py-3 leading-[1.375rem]`}
        />
      )}
    </Field>
  );
}
