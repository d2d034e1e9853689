import type { PackageSummary } from '#contract/packages';
import type { RunDetail as Detail } from '#contract/runs';
import type { ItemKind } from '#domain/load/model';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { Icon } from '../../../components/icon';
import { countOfKind, KindIcon } from '../../../components/item-kind';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { FilmPanel } from '../../../components/ui/film-panel';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { Moment } from '../../../components/ui/time';
import { sentenceOf } from '../../../lib/errors';
import { countOf } from '../../../lib/format';
import { newRequestId } from '../../../lib/request-id';
import { useScanner } from '../../../lib/scanner-input';
import { useMay } from '../../../lib/session';
import { useSounds } from '../../../lib/sounds';
import { useDropRun, useScanIntoRun } from '../mutations';
import { runQueries } from '../queries';
import { ChangeRunSheet } from './change-run-sheet';
import { answerOf, RunScanLine, type LastStaging } from './run-scan-line';

export type KeyInProps = { readonly onCode: (code: string) => void; readonly onClose: () => void };

type RunDetailProps = {
  readonly runId: string;
  readonly onPackage: (one: PackageSummary) => void;
  readonly onDropped: () => void;
  readonly onOpenLoad: () => void;
  /** Types a code, or reads it with the camera. */
  readonly keyInOf: (props: KeyInProps) => ReactNode;
};

const columns: readonly Column<PackageSummary>[] = [
  {
    key: 'item',
    header: 'Package',
    sortBy: (one) => one.item.name,
    cell: (one) => (
      <span className="flex items-center gap-2.5">
        <KindIcon kind={one.item.kind} className="text-ink-2" />
        <span className="min-w-0">
          <span className="font-semibold">{one.item.name}</span>
          {one.item.isImplant && (
            <>
              <Icon name="implant" size={15} className="ml-1.5 text-ink-1" />
              <span className="sr-only">, implant</span>
            </>
          )}
        </span>
      </span>
    ),
  },
  { key: 'code', header: 'Code', width: '9.5rem', sortBy: (one) => one.code, cell: (one) => <Code>{one.code}</Code> },
  { key: 'goes', header: 'Goes to', isWideOnly: true, width: '8rem', cell: (one) => one.destination },
  {
    key: 'packed',
    header: 'Packed',
    isWideOnly: true,
    width: '6rem',
    align: 'end',
    sortBy: (one) => one.packedAt,
    cell: (one) => <Moment at={one.packedAt} />,
  },
];

/** One run: scan packages into it, see what waits in it, open its load. */
export function RunDetail({ runId, ...acts }: RunDetailProps) {
  const detail = useQuery(runQueries.detail(runId));
  if (detail.data) return <Shown key={runId} detail={detail.data} {...acts} />;
  return detail.isError ? (
    <WrongState
      title="This run did not come"
      error={detail.error}
      onTryAgain={() => {
        void detail.refetch();
      }}
    />
  ) : (
    <WaitingState title="Fetching the run" waitsFor="The server has not answered yet." lines={6} />
  );
}

function turnAfter(last: LastStaging): number {
  return last.kind === 'none' ? 1 : last.turn + 1;
}

function Shown({
  detail: { run, packages },
  onPackage,
  onDropped,
  onOpenLoad,
  keyInOf,
}: Omit<RunDetailProps, 'runId'> & { readonly detail: Detail }) {
  const mayStage = useMay('package.stage');
  const mayOpen = useMay('load.open');
  const announce = useAnnounce();
  const sounds = useSounds();
  const scanInto = useScanIntoRun(run.id);
  const drop = useDropRun();
  const [last, setLast] = useState<LastStaging>({ kind: 'none' });
  const [isKeyingIn, setIsKeyingIn] = useState(false);
  const [isChanging, setIsChanging] = useState(false);
  const [isDropping, setIsDropping] = useState(false);
  const [dropRequestId] = useState(newRequestId);
  const isWaiting = run.state === 'waiting';

  async function take(raw: string) {
    try {
      const reply = await scanInto.mutateAsync({ requestId: newRequestId(), raw });
      setLast((before) => ({ kind: 'answered', turn: turnAfter(before), reply }));
      sounds.play(answerOf(reply).sound);
      announce(reply.sentence, reply.answer === 'taken' ? 'polite' : 'assertive');
    } catch (error) {
      const sentence = sentenceOf(error);
      setLast((before) => ({ kind: 'refused', turn: turnAfter(before), sentence }));
      sounds.play('not-taken');
      announce(sentence, 'assertive');
    }
  }

  useScanner(
    (scan) => {
      void take(scan.text);
    },
    { isOn: mayStage && isWaiting && !isKeyingIn && !isChanging },
  );

  return (
    <section
      aria-label={run.name}
      className="grid content-start gap-4 tablet:h-full tablet:grid-rows-[auto_auto_minmax(0,1fr)]"
    >
      {mayStage && isWaiting && (
        <FilmPanel label="Last scan" className="max-tablet:-mx-4">
          <RunScanLine
            last={last}
            aside={
              <Button
                kind="plain"
                icon="keys"
                className="max-tablet:w-full"
                onPress={() => {
                  setIsKeyingIn(true);
                }}
              >
                Key in a code
              </Button>
            }
          />
        </FilmPanel>
      )}
      <header className="flex flex-wrap items-start gap-x-6 gap-y-3">
        <div className="min-w-0 flex-1 basis-80">
          <h2 className="text-title">{run.name}</h2>
          <p className="text-row text-ink-2">
            {[run.sterilizer?.name ?? 'Any sterilizer', run.program?.name].filter(Boolean).join(', ')}
            {run.wantedAt !== null && (
              <>
                , wanted for <Moment at={run.wantedAt} />
              </>
            )}
          </p>
          <Contents packages={packages} />
        </div>
        <div className="flex flex-wrap gap-2.5">
          {mayStage && isWaiting && (
            <>
              <Button
                kind="quiet"
                onPress={() => {
                  setIsChanging(true);
                }}
              >
                Change this run
              </Button>
              <Button
                kind="quiet"
                onPress={() => {
                  setIsDropping(true);
                }}
              >
                Drop this run
              </Button>
            </>
          )}
          {mayOpen && isWaiting && (
            <Button
              icon="load"
              onPress={onOpenLoad}
              blockedBecause={
                packages.length === 0 ? 'Nothing waits in this run yet. Scan packages into it.' : undefined
              }
            >
              Open its load
            </Button>
          )}
          {run.load !== null && <p className="self-center font-semibold">On load {run.load.number}</p>}
        </div>
      </header>
      <div className="min-h-0 tablet:overflow-y-auto">
        <DataTable
          label={`Packages in ${run.name}`}
          columns={columns}
          rows={packages}
          keyOf={(one) => one.id}
          onOpen={onPackage}
          empty={
            <EmptyState title="Nothing waits in this run">
              Scan the labels of packages, or put them in when they are packed.
            </EmptyState>
          }
        />
      </div>
      {isKeyingIn &&
        keyInOf({
          onCode: (code) => {
            void take(code);
          },
          onClose: () => {
            setIsKeyingIn(false);
          },
        })}
      {isChanging && (
        <ChangeRunSheet
          run={run}
          onClose={() => {
            setIsChanging(false);
          }}
        />
      )}
      <ConfirmDialog
        isOpen={isDropping}
        onClose={() => {
          setIsDropping(false);
        }}
        title={`Drop “${run.name}”?`}
        confirmWords="Drop the run"
        waitingWords="Dropping it"
        kind="stop"
        onConfirm={async () => {
          await drop.mutateAsync({ runId: run.id, requestId: dropRequestId });
          onDropped();
        }}
      >
        {packages.length === 0
          ? 'Nothing waits in it.'
          : `${countOf(packages.length, 'package')} will be packed and free again.`}
      </ConfirmDialog>
    </section>
  );
}

const kindOrder: readonly ItemKind[] = [
  'pouch',
  'wrapped-tray',
  'rigid-container',
  'basin',
  'textile-pack',
  'challenge-device',
];

/** What waits, by kind, in small drawings and words. */
function Contents({ packages }: { packages: readonly PackageSummary[] }) {
  const counts = kindOrder
    .map((kind) => ({ kind, count: packages.filter((one) => one.item.kind === kind).length }))
    .filter(({ count }) => count > 0);
  const implants = packages.filter((one) => one.item.isImplant).length;
  if (counts.length === 0) return null;
  return (
    <ul aria-label="By kind" className="mt-2 flex flex-wrap gap-x-5 gap-y-1">
      {counts.map(({ kind, count }) => (
        <li key={kind} className="flex items-center gap-2">
          <KindIcon kind={kind} size={20} className="text-film-4" />
          {countOfKind(kind, count)}
        </li>
      ))}
      {implants > 0 && (
        <li className="flex items-center gap-2 font-semibold">
          <Icon name="implant" size={18} />
          {countOf(implants, 'implant')}
        </li>
      )}
    </ul>
  );
}
