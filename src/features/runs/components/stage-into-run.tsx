import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { LinkButton } from '../../../components/ui/link-button';
import { SelectField } from '../../../components/ui/select-field';
import { sentenceOf } from '../../../lib/errors';
import { countOf } from '../../../lib/format';
import { newRequestId } from '../../../lib/request-id';
import { useMay } from '../../../lib/session';
import { useRemovePackages, useStagePackages } from '../mutations';
import { runQueries } from '../queries';

/** Puts packages into a run that waits. */
export function StageIntoRun({ packageIds, runsAddress }: { packageIds: readonly string[]; runsAddress: string }) {
  const may = useMay('package.stage');
  const runs = useQuery(runQueries.list());
  const stage = useStagePackages();
  const [runId, setRunId] = useState('');
  const [requestId, setRequestId] = useState(newRequestId);
  if (!may || runs.data === undefined) return null;
  const staged = runs.data.find((run) => run.id === stage.variables?.runId);
  if (stage.isSuccess) {
    return (
      <p role="status" className="flex items-center gap-2.5 font-semibold">
        <Icon name="tick" className="text-film-4" />
        {countOf(stage.data.staged, 'package')} staged{staged ? ` into “${staged.name}”` : ''}
      </p>
    );
  }
  if (runs.data.length === 0) {
    return (
      <LinkButton to={runsAddress} kind="quiet" className="justify-self-start">
        Make a run for them
      </LinkButton>
    );
  }
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap items-end gap-3">
        <SelectField
          label="Stage into a run"
          className="min-w-60 flex-1"
          placeholder="Choose a run"
          options={runs.data.map((run) => ({
            value: run.id,
            label: `${run.name}, ${countOf(run.packages, 'package')}`,
          }))}
          value={runId}
          onChange={(event) => {
            setRunId(event.target.value);
            setRequestId(newRequestId());
          }}
        />
        <Button
          kind="quiet"
          blockedBecause={runId === '' ? 'Choose a run first.' : undefined}
          waitingWords={stage.isPending ? 'Staging' : undefined}
          onPress={() => {
            stage.mutate({ runId, requestId, packageIds });
          }}
        >
          {packageIds.length === 1 ? 'Stage it' : `Stage ${packageIds.length}`}
        </Button>
      </div>
      {stage.isError && (
        <p role="alert" className="text-row font-semibold text-madder-3">
          {sentenceOf(stage.error)}
        </p>
      )}
    </div>
  );
}

/** Takes one package out of the run it waits in. */
export function TakeOutOfRun({
  packageId,
  run,
}: {
  packageId: string;
  run: { readonly id: string; readonly name: string };
}) {
  const may = useMay('package.stage');
  const remove = useRemovePackages();
  const [requestId] = useState(newRequestId);
  if (!may) return null;
  return (
    <div className="grid justify-items-start gap-2">
      <Button
        kind="quiet"
        waitingWords={remove.isPending ? 'Taking it out' : undefined}
        onPress={() => {
          remove.mutate({ runId: run.id, requestId, packageIds: [packageId] });
        }}
      >
        {`Take it out of “${run.name}”`}
      </Button>
      {remove.isError && (
        <p role="alert" className="text-row font-semibold text-madder-3">
          {sentenceOf(remove.error)}
        </p>
      )}
    </div>
  );
}
