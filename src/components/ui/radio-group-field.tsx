import { useId, type ComponentPropsWithRef, type ReactNode } from 'react';
import { describedBy, FieldError } from './field';

export type RadioOption = {
  readonly value: string;
  readonly label: string;
  readonly note?: ReactNode;
  readonly isDisabled?: boolean;
};

export type RadioGroupFieldProps = Omit<
  ComponentPropsWithRef<'input'>,
  'id' | 'className' | 'type' | 'value' | 'defaultValue' | 'checked' | 'name'
> & {
  label: string;
  name: string;
  options: readonly RadioOption[];
  /** With `onChange` of your own. A form's `register('name')` needs neither value. */
  value?: string | undefined;
  defaultValue?: string;
  hint?: ReactNode;
  error?: string | undefined;
  /** rows: one under another, with notes. side-by-side: a few short words. */
  layout?: 'rows' | 'side-by-side';
  isLabelHidden?: boolean;
  className?: string;
};

/** One of a few that should all be seen. Arrow keys move the choice. */
export function RadioGroupField({
  label,
  name,
  options,
  value,
  defaultValue,
  hint,
  error,
  layout = 'rows',
  isLabelHidden = false,
  className = '',
  ...input
}: RadioGroupFieldProps) {
  const id = useId();
  const isSideBySide = layout === 'side-by-side';
  return (
    <fieldset className={className} aria-describedby={describedBy(id, { hint, error })}>
      <legend className={isLabelHidden ? 'sr-only' : 'mb-1 text-small font-medium'}>{label}</legend>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mb-1.5 text-small text-ink-2">
          {hint}
        </p>
      )}
      <div className={isSideBySide ? 'flex flex-wrap gap-2' : 'divide-y divide-paper-3'}>
        {options.map((option) => (
          <label
            key={option.value}
            className={
              isSideBySide
                ? 'flex min-h-12 items-center gap-2.5 rounded px-3.5 font-semibold shadow-[inset_0_0_0_1px_var(--color-paper-edge)] has-checked:bg-film-1 has-checked:shadow-[inset_0_0_0_2px_var(--color-film-4)]'
                : 'flex min-h-12 items-center gap-3 py-1.5'
            }
          >
            <input
              {...input}
              type="radio"
              name={name}
              value={option.value}
              disabled={option.isDisabled}
              {...(value === undefined ? {} : { checked: value === option.value })}
              {...(defaultValue === undefined ? {} : { defaultChecked: defaultValue === option.value })}
              className="choice-dot"
            />
            <span>
              <span className="font-semibold">{option.label}</span>
              {option.note !== undefined && <span className="block text-small text-ink-2">{option.note}</span>}
            </span>
          </label>
        ))}
      </div>
      <FieldError id={`${id}-error`} error={error} />
    </fieldset>
  );
}
