import type { PackageDetail } from '#contract/packages';
import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { ImplantMark, KindIcon, kindInWords } from '../../../components/item-kind';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { Dialog } from '../../../components/ui/dialog';
import { PanelHead } from '../../../components/ui/heading';
import { FileLink } from '../../../components/ui/file-link';
import { WaitingState, WrongState } from '../../../components/ui/states';
import { DateText, Day } from '../../../components/ui/time';
import { newRequestId } from '../../../lib/request-id';
import { useMay } from '../../../lib/session';
import { openFileTab } from '../file-tab';
import { usePrintLabels } from '../mutations';
import { packageQueries } from '../queries';
import { StateWords } from './package-list';

type PackageSheetProps = {
  /** Id or code. */
  readonly packageRef: string;
  readonly onClose: () => void;
  /** Puts it into a run, or takes it out: what waits for runs knows how. */
  readonly stagingOf: (detail: PackageDetail) => ReactNode;
};

/** One package: what it is, what was said of it, its labels and all that happened to it. */
export function PackageSheet({ packageRef, onClose, stagingOf }: PackageSheetProps) {
  const detail = useQuery(packageQueries.detail(packageRef));
  return (
    <Dialog isOpen onClose={onClose} title={detail.data?.package.item.name ?? 'A package'} size="wide">
      {detail.data ? (
        <Told detail={detail.data} staging={stagingOf(detail.data)} />
      ) : detail.isError ? (
        <WrongState
          title="This package did not come"
          error={detail.error}
          onTryAgain={() => {
            void detail.refetch();
          }}
        />
      ) : (
        <WaitingState title="Fetching the package" waitsFor="The server has not answered yet." />
      )}
    </Dialog>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[8.5rem_1fr] gap-3 border-t border-paper-3 py-2 first:border-t-0">
      <dt className="text-ink-2">{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function Told({ detail, staging }: { detail: PackageDetail; staging: ReactNode }) {
  const { package: one } = detail;
  return (
    <div className="grid gap-6 tablet:grid-cols-2 tablet:gap-10">
      <section aria-label="Facts" className="grid content-start gap-4">
        <p className="flex flex-wrap items-center gap-x-4 gap-y-1 text-[1.0625rem]/[1.4375rem]">
          <KindIcon kind={one.item.kind} size={22} />
          <Code className="font-semibold">{one.code}</Code>
          <span>{kindInWords(one.item.kind)}</span>
          {one.item.isImplant && <ImplantMark />}
        </p>
        <dl className="text-row">
          <Fact name="Now">
            <StateWords one={one} />
            {one.heldReason !== null && <span className="block">{one.heldReason}</span>}
          </Fact>
          {one.state === 'staged' && one.run !== null && <Fact name="Waits in">{one.run.name}</Fact>}
          {one.openLoad !== null && <Fact name="Listed for">Load {one.openLoad.number}</Fact>}
          <Fact name="Packed by">
            {one.packedBy}, <DateText at={one.packedAt} form="with-time" />
          </Fact>
          <Fact name="Contents">{detail.isContentsConfirmed ? 'Confirmed complete' : 'Not confirmed'}</Fact>
          <Fact name="Internal CI">{detail.hasInternalIndicator ? 'Inside' : 'None said'}</Fact>
          <Fact name="External CI">{detail.hasExternalIndicator ? 'On it' : 'None said'}</Fact>
          <Fact name="Use">
            {one.expiresOn === null ? (
              'While whole and dry'
            ) : (
              <>
                Until <Day day={one.expiresOn} />
              </>
            )}
          </Fact>
          {one.destination !== '' && <Fact name="Goes to">{one.destination}</Fact>}
        </dl>
        <div className="grid gap-4">
          {staging}
          <LabelAgain detail={detail} />
        </div>
      </section>
      <section aria-label="What happened">
        <PanelHead title="What happened" level={3} />
        <ol className="mt-1">
          {detail.history.map((event) => (
            <li key={event.id} className="border-t border-paper-3 py-2 first:border-t-0">
              <p>{event.sentence}</p>
              <p className="text-small text-ink-2">
                {event.who}, <DateText at={event.at} form="with-time" />
              </p>
            </li>
          ))}
        </ol>
      </section>
    </div>
  );
}

/** The label once more. The first one has to go: two labels are two packages to a scanner. */
function LabelAgain({ detail }: { detail: PackageDetail }) {
  const may = useMay('package.print-labels');
  const print = usePrintLabels();
  const [isAsking, setIsAsking] = useState(false);
  const [requestId, setRequestId] = useState(newRequestId);
  if (!may) return null;
  const { package: one, labelPrints } = detail;
  const isFirst = labelPrints.length === 0;

  async function send(reason: string) {
    const tab = openFileTab();
    try {
      const request = { requestId, packageIds: [one.id], layout: 'single' as const };
      const { pdf } = await print.mutateAsync(isFirst ? request : { ...request, reason });
      tab.show(pdf);
      setRequestId(newRequestId());
    } catch (error) {
      tab.giveUp();
      throw error;
    }
  }

  return (
    <div className="flex flex-wrap gap-3">
      <Button
        kind="quiet"
        icon="print"
        onPress={() => {
          setIsAsking(true);
        }}
      >
        {isFirst ? 'Print its label' : 'Print its label again'}
      </Button>
      {print.data !== undefined && (
        <FileLink to={print.data.pdf} how="open" kind="plain">
          Open the label
        </FileLink>
      )}
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          setIsAsking(false);
        }}
        title={isFirst ? 'Print its label?' : 'Print its label again?'}
        confirmWords={isFirst ? 'Print the label' : 'Print another'}
        waitingWords="Making the label"
        {...(isFirst ? {} : { reason: { label: 'Why does it need another?', isNeeded: true } })}
        onConfirm={send}
      >
        {isFirst
          ? 'One label for this package.'
          : `It has had ${labelPrints.length === 1 ? 'one label' : `${labelPrints.length} labels`}. Take the old one off and throw it away: the new one says “Reprint ${labelPrints.length + 1}”.`}
      </ConfirmDialog>
    </div>
  );
}
