import { useId, type ComponentPropsWithRef, type ReactNode } from 'react';
import { describedBy, FieldError } from './field';

export type CheckboxFieldProps = Omit<ComponentPropsWithRef<'input'>, 'id' | 'className' | 'type'> & {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  className?: string;
};

/** Yes or no. The whole row is the target. Takes what `register('name')` gives. */
export function CheckboxField({ label, hint, error, className = '', ...input }: CheckboxFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label className="flex min-h-12 items-center gap-3 py-1.5">
        <input
          {...input}
          type="checkbox"
          id={id}
          aria-describedby={describedBy(id, { hint, error })}
          aria-invalid={error === undefined ? undefined : true}
          className="tick-box"
        />
        <span>
          <span className="font-semibold">{label}</span>
          {hint !== undefined && (
            <span id={`${id}-hint`} className="block text-small text-ink-2">
              {hint}
            </span>
          )}
        </span>
      </label>
      <FieldError id={`${id}-error`} error={error} />
    </div>
  );
}
