import type { Item } from '#contract/items';
import type { LabelLayout, PackRequest } from '#contract/packages';
import { decidePacking, defaultPackingPolicy } from '#domain/package/decide-packing';
import { useState } from 'react';
import { ImplantMark, kindInWords } from '../../../components/item-kind';
import { ProofStripe } from '../../../components/proof-stripe';
import { Button } from '../../../components/ui/button';
import { CheckboxField } from '../../../components/ui/checkbox-field';
import { Code } from '../../../components/ui/code';
import { SegmentedChoice } from '../../../components/ui/segmented-choice';
import { TextField } from '../../../components/ui/text-field';
import { sentenceOf } from '../../../lib/errors';
import { useFacility } from '../../../lib/facility';
import { countOf, formatSize } from '../../../lib/format';
import { newRequestId } from '../../../lib/request-id';
import { labelPlaceInWords, PackageDrawing } from './package-drawing';
import { packingStripe, type Said } from '../packing-stripe';
import { QuantityField, quantityOf } from './quantity-field';

type PackingPanelProps = {
  readonly item: Item;
  readonly isWaiting: boolean;
  readonly error: Error | null;
  readonly layout: LabelLayout;
  readonly onLayout: (layout: LabelLayout) => void;
  readonly onPack: (request: PackRequest) => void;
};

/** What has to be said of a package before it gets its label: each thing by an act of its own. */
export function PackingPanel({ item, isWaiting, error, layout, onLayout, onPack }: PackingPanelProps) {
  const { unitSystem } = useFacility();
  const [said, setSaid] = useState<Said>({ contents: false, internal: false, external: false });
  const [quantityText, setQuantityText] = useState('1');
  const [destination, setDestination] = useState('');
  // A repeat of the same statement is the same request; another statement is another one.
  const [requestId, setRequestId] = useState(newRequestId);
  const quantity = quantityOf(quantityText);

  function say(change: Partial<Said>) {
    setSaid({ ...said, ...change });
    setRequestId(newRequestId());
  }

  const decision = decidePacking(
    item,
    {
      isContentsConfirmed: said.contents,
      hasInternalIndicator: said.internal,
      hasExternalIndicator: said.external,
    },
    defaultPackingPolicy,
  );
  const block = decision.ok
    ? quantity === null
      ? 'Say first how many packages.'
      : undefined
    : decision.refusal.sentence;
  const warnings = decision.ok ? decision.value.warnings : [];

  return (
    <form
      className="grid gap-x-8 gap-y-4 tablet:h-full tablet:grid-cols-[minmax(0,1fr)_14rem] tablet:grid-rows-[auto_auto_minmax(0,1fr)_auto]"
      onSubmit={(event) => {
        event.preventDefault();
        if (block !== undefined || quantity === null || isWaiting) return;
        onPack({
          requestId,
          itemId: item.id,
          quantity,
          isContentsConfirmed: said.contents,
          hasInternalIndicator: said.internal,
          hasExternalIndicator: said.external,
          destination: destination.trim(),
        });
      }}
    >
      <header className="tablet:col-span-2">
        <h2 className="line-clamp-2 text-scan max-tablet:text-title">{item.name}</h2>
        <p className="mt-0.5 flex flex-wrap items-center gap-x-4 gap-y-1 text-[1.0625rem]/[1.4375rem]">
          <Code className="font-semibold">{item.code}</Code>
          <span>
            {kindInWords(item.kind)} {formatSize([item.widthMm, item.lengthMm], unitSystem)}
          </span>
          {item.isImplant && <ImplantMark />}
        </p>
      </header>

      <div className="max-tablet:hidden tablet:col-span-2">
        <ProofStripe stretches={packingStripe(item, said, null)} label="What is said of this package" />
      </div>

      <div className="grid content-start gap-6">
        <div className="divide-y divide-film-2">
          <CheckboxField
            className="py-2"
            label="Contents complete and in order"
            hint={contentsHint(item)}
            checked={said.contents}
            onChange={(event) => {
              say({ contents: event.target.checked });
            }}
          />
          <CheckboxField
            className="py-2"
            label="Internal CI lies inside"
            hint="In each package, where steam comes last."
            checked={said.internal}
            onChange={(event) => {
              say({ internal: event.target.checked });
            }}
          />
          <CheckboxField
            className="py-2"
            label="External CI is on the outside"
            hint="Tape, or the printed field of the pouch."
            checked={said.external}
            onChange={(event) => {
              say({ external: event.target.checked });
            }}
          />
        </div>
        <div className="flex flex-wrap items-end gap-x-6 gap-y-4">
          <QuantityField
            text={quantityText}
            onChange={(text) => {
              setQuantityText(text);
              setRequestId(newRequestId());
            }}
          />
          <TextField
            label="Goes to"
            isOptional
            placeholder="Room, clinic or case"
            className="min-w-48 flex-1"
            maxLength={80}
            value={destination}
            onChange={(event) => {
              setDestination(event.target.value);
              setRequestId(newRequestId());
            }}
          />
        </div>
      </div>

      <figure className="max-tablet:hidden">
        <PackageDrawing item={item} hasLabel={false} />
        <figcaption className="mt-3 text-center text-small text-ink-2">
          {labelPlaceInWords(item.kind)} Drawn to scale.
        </figcaption>
      </figure>

      <footer className="grid gap-3 border-t border-film-2 pt-4 tablet:col-span-2">
        {warnings.length > 0 && (
          <ul className="grid gap-1 border-l-4 border-straw-3 bg-straw-1 px-4 py-2.5 text-row">
            {warnings.map((warning) => (
              <li key={warning.code}>{warning.sentence}</li>
            ))}
          </ul>
        )}
        <p role="alert" className={error === null ? 'sr-only' : 'text-row font-semibold text-madder-3'}>
          {error === null ? '' : sentenceOf(error)}
        </p>
        <div className="flex flex-wrap items-center gap-4">
          <Button
            type="submit"
            size="large"
            icon="print"
            blockedBecause={block}
            waitingWords={isWaiting ? 'Making the labels' : undefined}
          >
            {quantity === null ? 'Print labels' : `Print ${countOf(quantity, 'label')}`}
          </Button>
          <SegmentedChoice
            label="Printed on"
            options={[
              { value: 'single', label: 'Label printer' },
              { value: 'sheet', label: 'A4 sheet' },
            ]}
            value={layout}
            onChange={onLayout}
          />
        </div>
      </footer>
    </form>
  );
}

/** A double pouch: perioperative packaging guideline of 2019, summary. Hinged instruments: N.J. Admin. Code 8:43G-8.11(a). */
function contentsHint({ packaging }: Pick<Item, 'packaging'>): string {
  const looked = 'You have looked: clean, dry, whole, hinges open, and everything on the list is there.';
  return packaging === 'double-pouch'
    ? `${looked} The inner pouch is not folded and lies the same way round as the outer: film to film.`
    : looked;
}
