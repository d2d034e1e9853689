import { useId } from 'react';
import { Icon } from '../icon';
import { controlLook } from './field';

type SearchFieldProps = {
  /** What is looked through: "Find an item". Read by screen readers and shown while empty. */
  label: string;
  value: string;
  onChange: (text: string) => void;
  /** "12 of 52", said as it changes. */
  result?: string;
  className?: string;
};

/** Narrows a list while it is typed. A scan goes past it, to the screen. Escape empties it. */
export function SearchField({ label, value, onChange, result, className = '' }: SearchFieldProps) {
  const id = useId();
  return (
    <div role="search" className={`relative ${className}`}>
      <label htmlFor={id} className="sr-only">
        {label}
      </label>
      <span className="pointer-events-none absolute inset-y-0 left-3.5 flex items-center text-ink-2">
        <Icon name="search" />
      </span>
      <input
        id={id}
        type="search"
        data-scan="yes"
        autoComplete="off"
        spellCheck={false}
        placeholder={label}
        value={value}
        onChange={(event) => {
          onChange(event.target.value);
        }}
        onKeyDown={(event) => {
          if (event.key === 'Escape' && value !== '') {
            event.stopPropagation();
            onChange('');
          }
        }}
        className={`${controlLook} pl-11 ${result === undefined ? '' : 'pr-24'}`}
      />
      {result !== undefined && (
        <span
          aria-live="polite"
          className="pointer-events-none absolute inset-y-0 right-3.5 flex items-center text-small text-ink-2"
        >
          {result}
        </span>
      )}
    </div>
  );
}
