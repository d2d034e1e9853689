import type { ComponentPropsWithRef } from 'react';
import { Icon } from '../icon';
import { controlLook, Field, type FieldWords } from './field';
import { wordsOf } from './text-field';

export type SelectOption = { readonly value: string; readonly label: string; readonly isDisabled?: boolean };

export type SelectFieldProps = FieldWords &
  Omit<ComponentPropsWithRef<'select'>, 'id' | 'className' | 'children'> & {
    options: readonly SelectOption[];
    /** The first line while nothing is chosen: "Choose a sterilizer". */
    placeholder?: string;
    className?: string;
  };

/** One of a few. The platform's own list, which opens large on a tablet. Takes what `register('name')` gives. */
export function SelectField({
  label,
  hint,
  error,
  isOptional,
  isLabelHidden,
  options,
  placeholder,
  className,
  ...select
}: SelectFieldProps) {
  return (
    <Field {...wordsOf({ label, hint, error, isOptional, isLabelHidden })} {...(className ? { className } : {})}>
      {(control) => (
        <div className="relative">
          <select {...select} {...control} className={`${controlLook} pr-11`}>
            {placeholder !== undefined && <option value="">{placeholder}</option>}
            {options.map((option) => (
              <option key={option.value} value={option.value} disabled={option.isDisabled}>
                {option.label}
              </option>
            ))}
          </select>
          <span className="pointer-events-none absolute inset-y-0 right-3.5 flex items-center text-film-4">
            <Icon name="down" />
          </span>
        </div>
      )}
    </Field>
  );
}
