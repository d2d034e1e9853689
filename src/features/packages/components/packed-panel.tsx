import type { Item } from '#contract/items';
import type { PackResponse } from '#contract/packages';
import type { ReactNode } from 'react';
import { Icon } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { ProofStripe } from '../../../components/proof-stripe';
import { FileLink } from '../../../components/ui/file-link';
import { sentenceOf } from '../../../lib/errors';
import { countOf } from '../../../lib/format';
import { packingStripe, type Said } from '../packing-stripe';
import { labelPlaceInWords, PackageDrawing } from './package-drawing';

export type PackedBatch = {
  readonly item: Item;
  readonly packages: PackResponse['packages'];
  readonly warnings: PackResponse['warnings'];
  readonly said: Said;
  /** Address of the labels; null while they are not printed. */
  readonly pdf: string | null;
};

type PackedPanelProps = {
  readonly batch: PackedBatch;
  readonly printError: Error | null;
  readonly isPrinting: boolean;
  readonly onPrintAgain: () => void;
  readonly onPackMore: () => void;
  /** Puts these packages into a run. */
  readonly staging: ReactNode;
};

/** What has just been packed: its codes, its labels, and where it goes next. */
export function PackedPanel({ batch, printError, isPrinting, onPrintAgain, onPackMore, staging }: PackedPanelProps) {
  const { item, packages, warnings, pdf } = batch;
  const heading = packages.length === 1 ? item.name : `${packages.length} × ${item.name}`;
  return (
    <div className="grid content-start gap-x-8 gap-y-5 tablet:grid-cols-[minmax(0,1fr)_14rem]">
      <header className="flex gap-4 tablet:col-span-2">
        <div className="grid h-22 w-16 flex-none animate-weld place-items-center content-center gap-1.5 weld text-small font-label">
          <Icon name="tick" size={34} />
          Packed
        </div>
        <div className="min-w-0 self-center">
          <h2 className="line-clamp-2 text-scan max-tablet:text-title">{heading}</h2>
          <p className="text-[1.0625rem]/[1.4375rem]">
            {countOf(packages.length, 'label')}. {labelPlaceInWords(item.kind)}
          </p>
        </div>
      </header>
      <div className="max-tablet:hidden tablet:col-span-2">
        <ProofStripe
          stretches={packingStripe(item, batch.said, pdf === null ? null : packages.length)}
          label="What is said of these packages"
        />
      </div>
      <div className="grid content-start gap-5">
        <ul aria-label="Codes" className="flex max-h-40 flex-wrap gap-x-5 gap-y-1 overflow-y-auto text-body">
          {packages.map((one) => (
            <li key={one.id}>
              <Code className="font-semibold">{one.code}</Code>
            </li>
          ))}
        </ul>
        {warnings.length > 0 && (
          <ul className="grid gap-1 border-l-4 border-straw-3 bg-straw-1 px-4 py-2.5 text-row">
            {warnings.map((warning) => (
              <li key={warning.code}>{warning.sentence}</li>
            ))}
          </ul>
        )}
        {printError !== null && (
          <p role="alert" className="text-row font-semibold text-madder-3">
            The packages are made, the labels are not: {sentenceOf(printError)}
          </p>
        )}
        <div className="flex flex-wrap gap-3">
          {pdf === null ? (
            <Button icon="print" onPress={onPrintAgain} waitingWords={isPrinting ? 'Making the labels' : undefined}>
              Print the labels
            </Button>
          ) : (
            <FileLink to={pdf} how="open" icon="print">
              Open the labels
            </FileLink>
          )}
          <Button kind="quiet" icon="plus" onPress={onPackMore}>
            Pack more of it
          </Button>
        </div>
        {staging}
      </div>
      <div className="max-tablet:hidden">
        <PackageDrawing item={item} hasLabel={pdf !== null} />
      </div>
    </div>
  );
}
