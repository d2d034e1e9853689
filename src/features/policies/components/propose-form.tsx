import type { PolicyOverview } from '#contract/policies';
import { policyParameters } from '#domain/load/policy';
import { daysToChoose } from '#domain/policy/decide-proposal';
import { facingRules } from '#domain/policy/settings';
import { zodResolver } from '@hookform/resolvers/zod';
import { useState, type ReactNode } from 'react';
import { useForm, useWatch, type Path } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { countProblems, FormPage } from '../../../components/stock/form-page';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { SelectField } from '../../../components/ui/select-field';
import { TextAreaField, TextField } from '../../../components/ui/text-field';
import { isProblem } from '../../../lib/errors';
import { useFacility } from '../../../lib/facility';
import { countOf, formatDay } from '../../../lib/format';
import { useProposeChange } from '../mutations';
import {
  baseOf,
  changesIn,
  fieldsOf,
  formFieldOf,
  proposalSchema,
  type Proposal,
  type ProposalFields,
} from '../proposal-form';
import { facingWords } from '../setting-words';
import { ChangeList } from './change-list';
import { SettingField } from './setting-field';

/** Every setting as it is, to be changed, with the reason and the day: one proposal. */
export function ProposeForm({ overview: current }: { readonly overview: PolicyOverview }) {
  // As it was when it was opened: what somebody else changes meanwhile must not be taken for one's own change.
  const [overview] = useState(current);
  const { unitSystem } = useFacility();
  const navigate = useNavigate();
  const announce = useAnnounce();
  const propose = useProposeChange();
  const write = useWrite();
  const base = baseOf(overview);
  const { register, control, handleSubmit, setError, formState } = useForm<ProposalFields, unknown, Proposal>({
    resolver: zodResolver(proposalSchema(overview, unitSystem)),
    defaultValues: fieldsOf(overview, unitSystem),
  });
  const { errors } = formState;
  const [values, facing] = useWatch({ control, name: ['values', 'facing'] });
  const changes = changesIn({ values, facing }, base.settings, unitSystem);
  const changed = new Set(changes.map((change) => (change.of === 'parameter' ? change.id : change.sterilizerId)));

  const send = handleSubmit(async (proposal) => {
    try {
      await write((requestId) => propose.mutateAsync({ ...proposal, requestId, baseNumber: base.number }));
      announce('The change is proposed. Another person confirms it.');
      await navigate('/policy/settings');
    } catch (error) {
      if (!isProblem(error)) return;
      for (const { pointer, detail } of error.fields) {
        setError(formFieldOf(pointer) as Path<ProposalFields>, { message: detail }, { shouldFocus: true });
      }
    }
  });

  return (
    <FormPage
      title="Propose a change of policy"
      onSend={() => void send()}
      onLeave={() => void navigate('/policy/settings')}
      sendWords={changes.length === 0 ? 'Propose it' : `Propose ${countOf(changes.length, 'change')}`}
      isSending={propose.isPending}
      refusal={propose.error}
      problemCount={countProblems(errors)}
      aside={<WhatChanges overview={overview} changes={changes} />}
    >
      <title>Propose a change of policy · Paperside</title>
      <p className="text-row">
        Change what should be otherwise. Another person confirms it before it is in force.
        <PlannedBase overview={overview} />
      </p>
      <Part title="Settings">
        <ul>
          {policyParameters.map((parameter) => (
            <SettingField
              key={parameter.id}
              parameter={parameter}
              now={base.settings.policy[parameter.id]}
              isChanged={changed.has(parameter.id)}
              field={register(`values.${parameter.id}`)}
              error={errors.values?.[parameter.id]?.message}
            />
          ))}
        </ul>
      </Part>
      {overview.sterilizers.length > 0 && (
        <Part
          title="Facing at single sterilizers"
          hint="Where the pouches of one sterilizer have other instructions for use than the rest."
        >
          <div className="grid gap-4 sm:grid-cols-2">
            {overview.sterilizers.map(({ id, name }) => (
              <SelectField
                key={id}
                label={name}
                options={['', ...facingRules].map((rule) => ({ value: rule, label: facingWords(rule || null) }))}
                error={errors.facing?.[id]?.message}
                {...register(`facing.${id}`)}
              />
            ))}
          </div>
        </Part>
      )}
      <Part title="Why, and from when">
        <div className="grid gap-4">
          <div className="tablet:hidden">
            <WhatChanges overview={overview} changes={changes} />
          </div>
          <TextAreaField
            label="Reason"
            hint="The second person reads it, and it stays with the version for good."
            error={errors.reason?.message}
            maxLength={500}
            {...register('reason')}
          />
          <TextField
            label="In force from"
            type="date"
            hint={`Loads opened from the beginning of this day on. Today is ${formatDay(overview.today)}.`}
            min={daysToChoose(overview.today).first}
            max={daysToChoose(overview.today).last}
            error={errors.effectiveOn?.message}
            className="max-w-64"
            {...register('effectiveOn')}
          />
        </div>
      </Part>
    </FormPage>
  );
}

function Part({
  title,
  hint,
  children,
}: {
  readonly title: string;
  readonly hint?: string;
  readonly children: ReactNode;
}) {
  return (
    <fieldset>
      <legend className="mb-1 w-full text-head">{title}</legend>
      {hint !== undefined && <p className="mb-3 text-small text-ink-2">{hint}</p>}
      {children}
    </fieldset>
  );
}

/** A newest version whose day has not come is what the change rests on: said, since it may then hold earlier. */
function PlannedBase({ overview }: { readonly overview: PolicyOverview }) {
  const [newest] = overview.versions;
  if (newest?.standing !== 'planned') return null;
  return (
    <b className="font-label">
      {' '}
      This rests on version {newest.number}, in force from {formatDay(newest.effectiveOn)}: with an earlier day, what
      that version changed is in force earlier too.
    </b>
  );
}

function WhatChanges({
  overview,
  changes,
}: {
  readonly overview: PolicyOverview;
  readonly changes: ReturnType<typeof changesIn>;
}) {
  return (
    <div>
      <p className="text-head">{changes.length === 0 ? 'Nothing changes yet' : `What changes, ${changes.length}`}</p>
      {changes.length === 0 ? (
        <p className="mt-1 text-row text-ink-2">Settings you change are listed here, from what to what.</p>
      ) : (
        <ChangeList label="What changes" changes={changes} sterilizers={overview.sterilizers} />
      )}
    </div>
  );
}
