import { useState, type ReactNode } from 'react';
import { useController, type Control, type FieldValues, type Path } from 'react-hook-form';
import { useFacility } from '../../lib/facility';
import { NumberField, TextField } from '../ui/text-field';
import { keptValue, shownText, unitOf, type QuantityKind } from './quantity';

type QuantityFieldProps<Values extends FieldValues, Transformed> = {
  control: Control<Values, unknown, Transformed>;
  name: Path<Values>;
  label: string;
  quantity: QuantityKind;
  /** For counts: "slots". */
  unit?: string;
  hint?: ReactNode;
  isOptional?: boolean;
  className?: string;
};

/** A figure of a form in the facility's unit. What was not touched keeps its exact value. */
export function QuantityField<Values extends FieldValues, Transformed>({
  control,
  name,
  label,
  quantity,
  unit,
  hint,
  isOptional = false,
  className,
}: QuantityFieldProps<Values, Transformed>) {
  const { unitSystem } = useFacility();
  const { field, fieldState } = useController({ control, name });
  const { ref: focusOn, onBlur, onChange, value } = field;
  const [text, setText] = useState(() => shownText(value as number | null | undefined, quantity, unitSystem));
  const shownUnit = unit ?? unitOf(quantity, unitSystem);
  return (
    <NumberField
      label={label}
      isOptional={isOptional}
      isWhole={quantity === 'count'}
      error={fieldState.error?.message}
      name={name}
      ref={focusOn}
      value={text}
      onBlur={onBlur}
      onChange={(event) => {
        setText(event.target.value);
        const kept = keptValue(event.target.value, { kind: quantity, unitSystem, mayBeEmpty: isOptional });
        onChange(kept);
      }}
      {...(shownUnit === '' ? {} : { unit: shownUnit })}
      {...(hint === undefined ? {} : { hint })}
      {...(className === undefined ? {} : { className })}
    />
  );
}

type CodesFieldProps<Values extends FieldValues, Transformed> = {
  control: Control<Values, unknown, Transformed>;
  name: Path<Values>;
  label: string;
  hint?: ReactNode;
};

/** Codes separated by spaces or commas. */
export function CodesField<Values extends FieldValues, Transformed>({
  control,
  name,
  label,
  hint,
}: CodesFieldProps<Values, Transformed>) {
  const { field, fieldState } = useController({ control, name });
  const { ref: focusOn, onBlur, onChange, value } = field;
  const [text, setText] = useState(() => ((value as readonly string[] | undefined) ?? []).join(' '));
  const { error } = fieldState;
  // The complaint about one of several codes lies with that one.
  const list: unknown = error;
  const inList = Array.isArray(list) ? (list.find(Boolean) as { message?: string } | undefined) : undefined;
  return (
    <TextField
      label={label}
      isOptional
      isCode
      error={error?.message ?? inList?.message}
      name={name}
      ref={focusOn}
      value={text}
      onBlur={onBlur}
      onChange={(event) => {
        setText(event.target.value);
        const codes = event.target.value.split(/[\s,;]+/).filter((code) => code !== '');
        onChange(codes);
      }}
      {...(hint === undefined ? {} : { hint })}
    />
  );
}
