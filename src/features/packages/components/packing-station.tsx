import type { Item } from '#contract/items';
import type { LabelLayout, PackageSummary, PackRequest } from '#contract/packages';
import { useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { Icon } from '../../../components/icon';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { FilmPanel } from '../../../components/ui/film-panel';
import { ScanAnswer } from '../../../components/ui/scan-answer';
import { sentenceOf } from '../../../lib/errors';
import { countOf } from '../../../lib/format';
import { newRequestId } from '../../../lib/request-id';
import { useScanner } from '../../../lib/scanner-input';
import { useSounds } from '../../../lib/sounds';
import { openFileTab, type FileTab } from '../file-tab';
import { useIdentify, usePack, usePrintLabels } from '../mutations';
import { packageQueries } from '../queries';
import { ItemChooser } from './item-chooser';
import { PackedPanel, type PackedBatch } from './packed-panel';
import { PackingPanel } from './packing-panel';

type PackingStationProps = {
  /** Puts packages into a run: what waits for runs knows how. */
  readonly stagingOf: (packageIds: readonly string[]) => ReactNode;
  /** One of our own labels was scanned: shows that package. */
  readonly onPackage: (one: PackageSummary) => void;
  /** Types a code, or reads it with the camera. */
  readonly keyInOf: (props: { readonly onCode: (code: string) => void; readonly onClose: () => void }) => ReactNode;
};

type Told = { readonly turn: number; readonly title: string; readonly sentence: string };

/** Choose or scan an item, say what is inside, print its labels. */
export function PackingStation({ stagingOf, onPackage, keyInOf }: PackingStationProps) {
  const client = useQueryClient();
  const announce = useAnnounce();
  const sounds = useSounds();
  const identify = useIdentify();
  const pack = usePack();
  const print = usePrintLabels();
  const [item, setItem] = useState<Item | null>(null);
  const [turn, setTurn] = useState(0);
  const [batch, setBatch] = useState<PackedBatch | null>(null);
  const [layout, setLayout] = useState<LabelLayout>('single');
  const [printRequestId, setPrintRequestId] = useState(newRequestId);
  const [isKeyingIn, setIsKeyingIn] = useState(false);
  const [told, setTold] = useState<Told | null>(null);

  function choose(next: Item) {
    setItem(next);
    setBatch(null);
    setTold(null);
    // Nothing said of one item holds for the next.
    setTurn(turn + 1);
    pack.reset();
    print.reset();
  }

  function tell(title: string, sentence: string) {
    setTold((before) => ({ turn: (before?.turn ?? 0) + 1, title, sentence }));
    sounds.play('not-taken');
    announce(sentence, 'assertive');
  }

  async function take(raw: string) {
    try {
      const answer = await identify.mutateAsync(raw);
      if (answer.found === 'package') {
        onPackage(answer.package);
        return;
      }
      if (answer.found === 'nothing' || answer.item.isRetired) {
        tell(answer.found === 'nothing' ? 'Not known' : 'Retired', answer.sentence);
        return;
      }
      const { items } = await client.query({ ...packageQueries.items(answer.item.code), staleTime: 60_000 });
      const found = items.find((one) => one.id === answer.item.id);
      if (!found) {
        tell('Not known', 'This item is not in the catalogue any more.');
        return;
      }
      sounds.play('taken');
      announce(answer.sentence);
      choose(found);
    } catch (error) {
      tell('No answer', sentenceOf(error));
    }
  }

  useScanner(
    (scan) => {
      void take(scan.text);
    },
    { isOn: !isKeyingIn },
  );

  async function printFor(made: PackedBatch, requestId: string, tab: FileTab) {
    try {
      const { pdf } = await print.mutateAsync({
        requestId,
        packageIds: made.packages.map((one) => one.id),
        layout,
      });
      setBatch({ ...made, pdf });
      tab.show(pdf);
    } catch {
      // The panel says it and offers to print again; the request id stays, so nothing is printed twice.
      tab.giveUp();
    }
  }

  async function packAndPrint(of: Item, request: PackRequest) {
    const tab = openFileTab();
    try {
      const { packages, warnings } = await pack.mutateAsync(request);
      const said = {
        contents: request.isContentsConfirmed,
        internal: request.hasInternalIndicator,
        external: request.hasExternalIndicator,
      };
      const made: PackedBatch = { item: of, packages, warnings, said, pdf: null };
      const requestId = newRequestId();
      setPrintRequestId(requestId);
      setBatch(made);
      announce(`${countOf(packages.length, 'package')} of ${of.name} packed.`);
      await printFor(made, requestId, tab);
    } catch {
      // The panel shows what the server said.
      tab.giveUp();
    }
  }

  return (
    <div className="grid gap-6 tablet:h-full tablet:min-h-0 tablet:grid-cols-[minmax(18rem,25rem)_minmax(0,1fr)]">
      <div
        className={`grid min-h-0 gap-3 tablet:grid-rows-[minmax(0,1fr)] ${item === null ? '' : 'max-tablet:hidden'}`}
      >
        <Button
          kind="quiet"
          icon="camera"
          className="tablet:hidden"
          onPress={() => {
            setIsKeyingIn(true);
          }}
        >
          Read a code, or key it in
        </Button>
        <ItemChooser
          chosenId={item?.id ?? null}
          onChoose={(chosen) => {
            announce(`${chosen.name}. Say what is inside, then print its label.`);
            choose(chosen);
          }}
        />
      </div>
      <FilmPanel
        label="Pack this item"
        className={`min-h-0 overflow-y-auto px-6 pt-6 pb-5 max-tablet:-mx-4 max-tablet:px-4 ${item === null && told === null ? 'max-tablet:hidden' : ''}`}
      >
        {told !== null && (
          <div key={told.turn} role="status" className="mb-5 animate-flash-edge">
            <ScanAnswer look="not-known" word={told.title} title={told.sentence}>
              Nothing was changed.
            </ScanAnswer>
          </div>
        )}
        {item !== null && (
          <Button
            kind="plain"
            icon="left"
            className="mb-3 -ml-3 tablet:hidden"
            onPress={() => {
              setItem(null);
            }}
          >
            Another item
          </Button>
        )}
        {item === null ? (
          <Ready
            onKeyIn={() => {
              setIsKeyingIn(true);
            }}
          />
        ) : batch === null ? (
          <PackingPanel
            key={`${item.id} ${turn}`}
            item={item}
            isWaiting={pack.isPending}
            error={pack.error}
            layout={layout}
            onLayout={setLayout}
            onPack={(request) => {
              void packAndPrint(item, request);
            }}
          />
        ) : (
          <PackedPanel
            batch={batch}
            printError={print.error}
            isPrinting={print.isPending}
            onPrintAgain={() => {
              void printFor(batch, printRequestId, openFileTab());
            }}
            onPackMore={() => {
              choose(item);
            }}
            staging={stagingOf(batch.packages.map((one) => one.id))}
          />
        )}
      </FilmPanel>
      {isKeyingIn &&
        keyInOf({
          onCode: (code) => {
            setIsKeyingIn(false);
            void take(code);
          },
          onClose: () => {
            setIsKeyingIn(false);
          },
        })}
    </div>
  );
}

function Ready({ onKeyIn }: { onKeyIn: () => void }) {
  return (
    <div className="grid h-full place-content-center justify-items-center gap-4 px-6 py-10 text-center">
      <span className="grid h-22 w-16 place-items-center bg-paper-0 text-film-5 shadow-[inset_0_0_0_2.4px_var(--color-film-4)]">
        <Icon name="scan" size={34} />
      </span>
      <p className="text-scan max-tablet:text-title">Scan the maker’s code, or choose an item</p>
      <p className="max-w-[34rem] text-[1.0625rem]/[1.4375rem]">
        Then say that the contents are complete and that the CIs are in place. Only then does it get its label.
      </p>
      <Button kind="quiet" icon="camera" onPress={onKeyIn}>
        Read a code with the camera, or key it in
      </Button>
    </div>
  );
}
