import { roles } from '#domain/access/permissions';
import type { FieldValues, Path, UseFormRegisterReturn, UseFormSetError } from 'react-hook-form';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { fieldNameOf, isProblem, sentenceOf } from '../../../lib/errors';
import { roleWords } from '#domain/access/role-words';

type Registered = { readonly field: UseFormRegisterReturn; readonly error: string | undefined };

const roleOptions = roles.map((role) => ({ value: role, label: roleWords[role] }));

type PlaceFieldsProps = {
  role: Registered;
  usualShift: Registered;
  expiresAt: Registered;
  isRoleChosen: boolean;
  facilityName: string;
};

/** Somebody's place in this facility: the same for who is new, who joins and who is here. */
export function PlaceFields({ role, usualShift, expiresAt, isRoleChosen, facilityName }: PlaceFieldsProps) {
  return (
    <>
      <SelectField
        label="Role"
        options={roleOptions}
        {...(isRoleChosen ? {} : { placeholder: 'Choose a role' })}
        error={role.error}
        {...role.field}
      />
      <TextField
        label="Usual shift"
        hint="Day, Evening, Night, or as you call it."
        isOptional
        error={usualShift.error}
        {...usualShift.field}
      />
      <TextField
        label="Ends on"
        type="datetime-local"
        hint={`When this person’s place at ${facilityName} ends. A surveyor’s always does.`}
        isOptional
        error={expiresAt.error}
        {...expiresAt.field}
      />
    </>
  );
}

/** What the server refused and no field shows. */
export function Refusal({ error }: { error: unknown }) {
  const isAtField = isProblem(error) && error.fields.length > 0;
  const sentence = error === null || isAtField ? null : sentenceOf(error);
  return (
    <p role="alert" className={sentence === null ? 'sr-only' : 'font-semibold text-madder-3'}>
      {sentence}
    </p>
  );
}

/** Puts what the server says about single fields beside them. */
export function showAtFields<Values extends FieldValues>(
  error: unknown,
  names: readonly Path<Values>[],
  setError: UseFormSetError<Values>,
): void {
  if (!isProblem(error)) return;
  for (const { pointer, detail } of error.fields) {
    const name = names.find((known) => known === fieldNameOf(pointer));
    if (name !== undefined) setError(name, { message: detail }, { shouldFocus: true });
  }
}

/** Enter in a field sends the form: its visible button lies at the foot of the dialog, outside of it. */
export function EnterSends() {
  return <button type="submit" className="hidden" tabIndex={-1} aria-hidden="true" />;
}

/** Sends a form from the foot of its dialog. */
export function sendForm(formId: string): void {
  const form = document.getElementById(formId);
  if (form instanceof HTMLFormElement) form.requestSubmit();
}
