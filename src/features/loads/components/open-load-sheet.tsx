import type { LoadOpeningOptions } from '#contract/loads';
import { serviceStateWords } from '#domain/catalogue/service-state-words';
import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { useForm, useWatch } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { SelectField } from '../../../components/ui/select-field';
import { WaitingState, WrongState } from '../../../components/ui/states';
import { useFacility } from '../../../lib/facility';
import { countOf, formatDuration, formatTemperature, formatTime } from '../../../lib/format';
import { sentenceOf } from '../../../lib/errors';
import { useOpenLoad } from '../mutations';
import { loadQueries } from '../queries';

const formSchema = z.object({
  sterilizerId: z.string().min(1, 'Choose a sterilizer.'),
  programId: z.string().min(1, 'Choose a program.'),
  cartId: z.string().min(1, 'Choose a cart.'),
  runId: z.string(),
});
type Form = z.infer<typeof formSchema>;

/** Opens a load: which run of packages, on which sterilizer, program and cart. */
export function OpenLoadSheet({ onClose, runId }: { onClose: () => void; runId?: string }) {
  const options = useQuery(loadQueries.openingOptions());
  return (
    <Dialog isOpen onClose={onClose} title="Open a load" material="film" size="wide">
      {options.data ? (
        <OpenLoadForm options={options.data} runId={runId ?? ''} />
      ) : options.isError ? (
        <WrongState
          title="The sterilizers did not come"
          error={options.error}
          onTryAgain={() => {
            void options.refetch();
          }}
        />
      ) : (
        <WaitingState title="Fetching sterilizers and carts" waitsFor="The server has not answered yet." />
      )}
    </Dialog>
  );
}

function OpenLoadForm({ options, runId }: { options: LoadOpeningOptions; runId: string }) {
  const navigate = useNavigate();
  const { timeZone, unitSystem } = useFacility();
  const openLoad = useOpenLoad();
  const start = options.runs.find((entry) => entry.id === runId);
  const form = useForm<Form>({
    resolver: zodResolver(formSchema),
    defaultValues: { ...startWith(options, start?.sterilizerId ?? null, start?.programId ?? null), runId },
  });
  const { errors } = form.formState;
  // The lists of programs and carts change with the sterilizer, so their choice is told them anew each time: a list that is
  // left to itself drops a choice made before its entry was there.
  const values = useWatch({ control: form.control });
  const chosen = options.sterilizers.find((entry) => entry.sterilizer.id === values.sterilizerId);
  const run = options.runs.find((entry) => entry.id === values.runId);
  const wanted = options.sterilizers.find((entry) => entry.sterilizer.id === run?.sterilizerId)?.sterilizer;

  /** Another sterilizer has other programs and carts: what was chosen before may not be there. */
  function choose(start: Omit<Form, 'runId'>) {
    form.setValue('sterilizerId', start.sterilizerId, { shouldValidate: start.sterilizerId !== '' });
    form.setValue('programId', start.programId);
    form.setValue('cartId', start.cartId);
  }

  async function send(form: Form) {
    const { loadId } = await openLoad.mutateAsync({ ...form, runId: form.runId === '' ? null : form.runId });
    await navigate(`/loads/${loadId}`);
  }

  return (
    <form
      className="grid gap-4 tablet:grid-cols-2"
      onSubmit={(event) => {
        void form
          .handleSubmit(send)(event)
          .catch(() => undefined);
      }}
    >
      <SelectField
        label="Packages"
        className="tablet:col-span-2"
        options={[
          { value: '', label: 'None listed: scan whatever goes on' },
          ...options.runs.map((run) => ({
            value: run.id,
            label: `${run.name}, ${countOf(run.packages, 'package')}${run.implants > 0 ? `, ${countOf(run.implants, 'implant')}` : ''}`,
          })),
        ]}
        value={values.runId ?? ''}
        {...form.register('runId', {
          onChange: (event: { target: { value: string } }) => {
            const next = options.runs.find((entry) => entry.id === event.target.value);
            if (next?.sterilizerId) choose(startWith(options, next.sterilizerId, next.programId));
          },
        })}
      />
      <SelectField
        label="Sterilizer"
        placeholder="Choose a sterilizer"
        error={errors.sterilizerId?.message}
        {...(wanted !== undefined && !isInService(wanted)
          ? { hint: `This run is meant for ${wanted.name}, which is ${stateOf(wanted)}. Choose another sterilizer.` }
          : {})}
        options={options.sterilizers.map(({ sterilizer }) => ({
          value: sterilizer.id,
          label: isInService(sterilizer) ? sterilizer.name : `${sterilizer.name}, ${stateOf(sterilizer)}`,
          isDisabled: !isInService(sterilizer),
        }))}
        value={values.sterilizerId ?? ''}
        {...form.register('sterilizerId', {
          onChange: (event: { target: { value: string } }) => {
            choose(startWith(options, event.target.value, run?.programId ?? null));
          },
        })}
      />
      <SelectField
        label="Program"
        placeholder="Choose a program"
        error={errors.programId?.message}
        {...(chosen && chosen.unqualified.length > 0
          ? { hint: `On its panel, but not qualified: ${chosen.unqualified.map((program) => program.code).join(', ')}` }
          : {})}
        options={(chosen?.programs ?? []).map((program) => ({
          value: program.id,
          label: `${program.code}: ${formatTemperature(program.temperatureC, unitSystem)}, ${formatDuration(program.exposureS)}, dry ${formatDuration(program.dryS)}`,
        }))}
        value={values.programId ?? ''}
        {...form.register('programId')}
      />
      <SelectField
        label="Cart"
        placeholder="Choose a cart"
        error={errors.cartId?.message}
        options={(chosen?.carts ?? []).map((cart) => ({
          value: cart.id,
          label: cart.isFree ? cart.name : `${cart.name}, ${cart.usedBy ?? 'out of use'}`,
          isDisabled: !cart.isFree,
        }))}
        value={values.cartId ?? ''}
        {...form.register('cartId')}
      />
      <div className="self-end pb-3 text-row" role="status">
        {chosen &&
          (chosen.airRemoval === null ? (
            <b className="font-label text-straw-3">
              {chosen.sterilizer.needsAirRemovalTest
                ? 'No air-removal test today: the load cannot be closed before it has passed.'
                : ''}
            </b>
          ) : chosen.airRemoval.result === 'passed' ? (
            `Air-removal test passed ${formatTime(chosen.airRemoval.testedAt, timeZone)}.`
          ) : (
            <b className="font-label text-madder-3">
              The air-removal test failed at {formatTime(chosen.airRemoval.testedAt, timeZone)}.
            </b>
          ))}
      </div>
      {openLoad.isError && (
        <p role="alert" className="text-row font-semibold text-madder-3 tablet:col-span-2">
          {sentenceOf(openLoad.error)}
        </p>
      )}
      <Button
        type="submit"
        size="large"
        className="tablet:col-span-2"
        waitingWords={openLoad.isPending ? 'Opening the load' : undefined}
      >
        Open the load
      </Button>
    </form>
  );
}

type SterilizerOption = LoadOpeningOptions['sterilizers'][number]['sterilizer'];

function isInService({ serviceState }: Pick<SterilizerOption, 'serviceState'>): boolean {
  return serviceState === 'in-service';
}

function stateOf({ serviceState }: Pick<SterilizerOption, 'serviceState'>): string {
  return serviceStateWords[serviceState].toLowerCase();
}

/** What follows from a sterilizer, and from the program a run names for it; nothing where it is not in service. */
function startWith(
  options: LoadOpeningOptions,
  sterilizerId: string | null,
  programId: string | null,
): Omit<Form, 'runId'> {
  const entry = options.sterilizers.find(({ sterilizer }) => sterilizer.id === sterilizerId && isInService(sterilizer));
  return {
    sterilizerId: entry?.sterilizer.id ?? '',
    programId: entry?.programs.find((program) => program.id === programId)?.id ?? '',
    cartId: entry?.carts.find((cart) => cart.isFree)?.id ?? '',
  };
}
