import { useId } from 'react';

type SegmentedChoiceProps<Value extends string> = {
  label: string;
  options: readonly { readonly value: Value; readonly label: string }[];
  value: Value;
  onChange: (value: Value) => void;
  className?: string;
};

/** One of two to four short words, always all seen: "Open", "Closed", "All". Arrow keys move it. */
export function SegmentedChoice<Value extends string>({
  label,
  options,
  value,
  onChange,
  className = '',
}: SegmentedChoiceProps<Value>) {
  const name = useId();
  return (
    <fieldset className={className}>
      <legend className="sr-only">{label}</legend>
      <div className="inline-flex shadow-[inset_0_0_0_1.5px_var(--color-film-3)]">
        {options.map((option) => (
          <label
            key={option.value}
            className="flex min-h-12 items-center border-l-[1.5px] border-film-3 px-4 font-semibold text-film-4 first:border-l-0 has-checked:bg-film-5 has-checked:text-paper-0 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink-1"
          >
            <input
              type="radio"
              name={name}
              className="sr-only"
              checked={option.value === value}
              onChange={() => {
                onChange(option.value);
              }}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
