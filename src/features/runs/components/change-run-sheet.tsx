import type { RunSummary } from '#contract/runs';
import { instantAt } from '#domain/time/instant-at';
import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { Dialog } from '../../../components/ui/dialog';
import { SelectField } from '../../../components/ui/select-field';
import { TextField } from '../../../components/ui/text-field';
import { sentenceOf } from '../../../lib/errors';
import { useFacility } from '../../../lib/facility';
import { dayOf, formatTime } from '../../../lib/format';
import { newRequestId } from '../../../lib/request-id';
import { serverNow } from '../../../lib/server-clock';
import { useChangeRun } from '../mutations';
import { changeRunFormSchema, type ChangeRunForm } from '../run-form';
import { isPast, timeOfText, wantedDays } from '../wanted-at';

/** Another name, day or hour for a run that waits. */
export function ChangeRunSheet({ run, onClose }: { run: RunSummary; onClose: () => void }) {
  const { timeZone } = useFacility();
  const change = useChangeRun(run.id);
  const announce = useAnnounce();
  const [now] = useState(serverNow);
  // The run as it was when the form was opened: a change by somebody else is told, not overwritten.
  const [version] = useState(run.version);
  const [requestId, setRequestId] = useState(newRequestId);
  const form = useForm<ChangeRunForm>({
    resolver: zodResolver(changeRunFormSchema),
    defaultValues: {
      name: run.name,
      day: dayOf(run.wantedAt ?? now, timeZone),
      time: run.wantedAt === null ? '' : formatTime(run.wantedAt, timeZone),
    },
  });
  const { errors } = form.formState;
  const day = useWatch({ control: form.control, name: 'day' });

  async function send({ name, day, time }: ChangeRunForm) {
    const hour = timeOfText(time);
    const wantedAt = hour === null ? null : instantAt({ day, time: hour }, timeZone);
    const isMoved = hour === null ? run.wantedAt !== null : wantedAt !== minuteOf(run.wantedAt);
    if (wantedAt !== null && isMoved && isPast(wantedAt, serverNow())) {
      form.setError('time', { message: 'This is past already. Write a later time, or choose another day.' });
      return;
    }
    await change.mutateAsync({ requestId, version, name, ...(isMoved ? { wantedAt } : {}) });
    announce(`${name} is kept.`);
    onClose();
  }

  return (
    <Dialog isOpen onClose={onClose} title="Change this run" material="film">
      <form
        noValidate
        className="grid gap-4 tablet:grid-cols-2"
        onChange={() => {
          setRequestId(newRequestId());
        }}
        onSubmit={(event) => {
          void form
            .handleSubmit(send)(event)
            .catch(() => undefined);
        }}
      >
        <TextField
          label="Name"
          className="tablet:col-span-2"
          maxLength={80}
          autoFocus
          error={errors.name?.message}
          {...form.register('name')}
        />
        <SelectField
          label="Wanted on"
          options={wantedDays(run.wantedAt, now, timeZone)}
          value={day}
          {...form.register('day')}
        />
        <TextField
          label="Wanted for"
          isOptional
          placeholder="14:30"
          maxLength={5}
          error={errors.time?.message}
          {...form.register('time')}
        />
        <p
          role="alert"
          className={
            change.isError ? 'text-row font-semibold text-madder-3 tablet:col-span-2' : 'sr-only tablet:col-span-2'
          }
        >
          {change.isError ? sentenceOf(change.error) : ''}
        </p>
        <Button type="submit" className="tablet:col-span-2" waitingWords={change.isPending ? 'Keeping it' : undefined}>
          Keep the changes
        </Button>
      </form>
    </Dialog>
  );
}

/** The form shows whole minutes: a run wanted at 14:30:20 has not been moved by showing 14:30. */
function minuteOf(at: string | null): string | null {
  return at === null ? null : new Date(Math.floor(Date.parse(at) / 60_000) * 60_000).toISOString();
}
