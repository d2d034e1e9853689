import type { Item } from '#contract/items';
import { useState } from 'react';
import { ImplantMark, kindInWords } from '../../../components/item-kind';
import { cycleTypeWords } from '../../../components/stock/cycle-words';
import { Fact, Facts } from '../../../components/stock/facts';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { ConfirmDialog } from '../../../components/ui/confirm-dialog';
import { useFacility } from '../../../lib/facility';
import { formatDuration, formatLength, formatMass } from '../../../lib/format';
import { useMay } from '../../../lib/session';
import { cycleInWords, metalWords, packagingWords, poseWords, facingWords } from '../item-words';
import { useChangeItem } from '../mutations';
import { ItemDrawing } from './item-drawing';

type ItemPanelProps = { item: Item; onChange: () => void };

/** One item: drawn to scale, what is known of it, what can be done about it. */
export function ItemPanel({ item, onChange }: ItemPanelProps) {
  const mayEdit = useMay('item.edit');
  return (
    <div className="grid gap-5">
      <p className="flex flex-wrap items-baseline gap-x-3 text-row">
        <Code className="font-semibold">{item.code}</Code>
        <span className="text-ink-2">{kindInWords(item.kind)}</span>
        {item.isImplant && <ImplantMark />}
        {item.isRetired && <span className="font-semibold text-straw-3">Retired</span>}
      </p>
      <ItemDrawing item={item} />
      <ItemFacts item={item} />
      {item.note !== '' && <p className="text-row [overflow-wrap:anywhere]">{item.note}</p>}
      {mayEdit && <ItemActs item={item} onChange={onChange} />}
    </div>
  );
}

function ItemFacts({ item }: { item: Item }) {
  const { unitSystem } = useFacility();
  const parts = [
    item.metalMassKg > 0 ? `${formatMass(item.metalMassKg, unitSystem)} ${metalWords[item.metal].toLowerCase()}` : null,
    item.textileMassKg > 0 ? `${formatMass(item.textileMassKg, unitSystem)} textile` : null,
  ].filter((part) => part !== null);
  return (
    <Facts>
      <Fact name="Packed in">{packagingWords[item.packaging]}</Fact>
      <Fact name="Rests">
        {poseWords[item.pose]}
        {!item.isPerforated && ', no holes in its floor'}
      </Fact>
      <Fact name="Mass">
        {formatMass(item.massKg, unitSystem)}
        {parts.length > 0 && <span className="block font-normal text-ink-2">{parts.join(', ')}</span>}
        {item.massLimitKg !== null && (
          <span className="block font-normal text-ink-2">at most {formatMass(item.massLimitKg, unitSystem)}</span>
        )}
      </Fact>
      <Fact name="Free space">
        {item.clearanceMm === null ? 'Not said' : `${formatLength(item.clearanceMm, unitSystem)} on every side`}
      </Fact>
      {item.preferredHolder !== null && <Fact name="Holder">{item.preferredHolder}</Fact>}
      {item.facing !== null && <Fact name="Facing">{facingWords[item.facing]}</Fact>}
      <Fact name="May stand on">{item.standsOn.length === 0 ? 'Nothing but a shelf' : item.standsOn.join(', ')}</Fact>
      <Fact name="Cycles">
        <ul className="grid gap-1">
          {item.cycleNeeds.map((need) => (
            <li key={`${need.type} ${need.temperatureC} ${need.leastExposureS}`}>
              {cycleTypeWords[need.type]}
              <span className="block font-normal">{cycleInWords(need, unitSystem)}</span>
            </li>
          ))}
        </ul>
      </Fact>
      <Fact name="Cools">{formatDuration(item.coolS)}</Fact>
      <Fact name="Expires">
        {item.expiryRule === 'dated' ? `${item.expiryDays ?? 0} days after packing` : 'By event only'}
      </Fact>
      <Fact name="IFU">
        {item.ifuReference === null ? (
          <span className="font-semibold text-straw-3">Not on file</span>
        ) : (
          `${item.ifuReference}${item.ifuRevision === null ? '' : ` rev ${item.ifuRevision}`}`
        )}
      </Fact>
      <Fact name="Identifier">{item.deviceIdentifier === null ? 'None' : <Code>{item.deviceIdentifier}</Code>}</Fact>
      {item.service !== '' && <Fact name="Used in">{item.service}</Fact>}
    </Facts>
  );
}

function ItemActs({ item, onChange }: ItemPanelProps) {
  const [isAsking, setIsAsking] = useState(false);
  const change = useChangeItem(item.id);
  const write = useWrite();
  const announce = useAnnounce();

  async function setRetired(isRetired: boolean) {
    await write((requestId) => change.mutateAsync({ requestId, version: item.version, isRetired }));
    announce(isRetired ? `${item.name} is retired.` : `${item.name} is packed again.`);
  }

  return (
    <div className="flex flex-wrap gap-2">
      <Button size="small" icon="edit" onPress={onChange}>
        Change it
      </Button>
      <Button
        size="small"
        kind="quiet"
        onPress={() => {
          setIsAsking(true);
        }}
      >
        {item.isRetired ? 'Pack it again' : 'Retire it'}
      </Button>
      <ConfirmDialog
        isOpen={isAsking}
        onClose={() => {
          setIsAsking(false);
        }}
        title={item.isRetired ? `Pack ${item.name} again?` : `Retire ${item.name}?`}
        confirmWords={item.isRetired ? 'Pack it again' : 'Retire it'}
        waitingWords="Keeping it"
        onConfirm={() => setRetired(!item.isRetired)}
      >
        {item.isRetired
          ? 'It stands in the list at packing again.'
          : 'It leaves the list at packing. Packages of it that are about stay what they are, and everything that was written about it stays.'}
      </ConfirmDialog>
    </div>
  );
}
