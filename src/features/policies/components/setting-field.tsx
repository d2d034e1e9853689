import type { PolicyParameter } from '#domain/load/policy';
import type { SettingValue } from '#domain/policy/settings';
import type { UseFormRegisterReturn } from 'react-hook-form';
import { SelectField } from '../../../components/ui/select-field';
import { NumberField } from '../../../components/ui/text-field';
import { useFacility } from '../../../lib/facility';
import { provenanceWords, rangeWords, unitWord, valueWords } from '../setting-words';

type SettingFieldProps = {
  readonly parameter: PolicyParameter;
  readonly now: SettingValue;
  readonly isChanged: boolean;
  readonly field: UseFormRegisterReturn;
  readonly error: string | undefined;
};

/** One setting to change: what it is and where its default comes from at the left, the value at the right. */
export function SettingField({ parameter, now, isChanged, field, error }: SettingFieldProps) {
  const { unitSystem } = useFacility();
  const words = (value: SettingValue) => valueWords(parameter, value, unitSystem);
  const colon = parameter.form === 'choice' ? ':' : '';
  const hint = [
    isChanged ? `Now${colon} ${words(now)}.` : '',
    parameter.form === 'quantity' ? `${rangeWords(parameter, unitSystem)}, default` : 'Default:',
    `${words(parameter.default)}.`,
  ].join(' ');
  const shared = { label: parameter.label, isLabelHidden: true, hint: hint.trim(), error, ...field };
  return (
    <li
      className={`-mx-3 grid gap-x-8 gap-y-2 border-t border-paper-3 px-3 py-3.5 min-[1100px]:grid-cols-[minmax(0,1fr)_20rem] ${isChanged ? 'bg-film-0 shadow-[inset_4px_0_0_var(--color-film-4)]' : ''}`}
    >
      <div>
        <p aria-hidden="true" className="text-body font-semibold">
          {parameter.label}
        </p>
        <p className="mt-0.5 max-w-[68ch] text-small text-ink-2">
          <span className="font-label text-ink-1">{provenanceWords(parameter)}.</span> {parameter.source.text}
        </p>
      </div>
      <div>
        {parameter.form === 'choice' ? (
          <SelectField {...shared} options={parameter.choices} />
        ) : (
          <NumberField {...shared} unit={unitWord(parameter, unitSystem)} />
        )}
      </div>
    </li>
  );
}
