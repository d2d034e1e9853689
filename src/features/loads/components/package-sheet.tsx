import { holderWords, placementWords } from '#domain/load/describe-place';
import type { LoadEdit } from '#domain/load/finding';
import type { Layout } from '#domain/load/layout';
import { findHolderKind, findItem, hasPaperSide, paperSidesOf } from '#domain/load/look-up';
import type { CatalogueItem, LoadPackage, LoadView, PaperSide, Placement, Pose, Turn } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import { suggestPlace } from '#domain/load/suggest-place';
import { mm } from '#domain/units/quantity';
import { useMemo, useState, type ReactNode } from 'react';
import { freeSlots } from '../../../components/cart-map/map-model';
import { Icon, type IconName } from '../../../components/icon';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { Dialog } from '../../../components/ui/dialog';
import { SelectField } from '../../../components/ui/select-field';
import { useFacility } from '../../../lib/facility';
import { formatMass, formatSize } from '../../../lib/format';

type PackageSheetProps = {
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly layout: Layout;
  readonly packageId: string;
  readonly mayBuild: boolean;
  readonly problem: string | null;
  readonly isWaiting: boolean;
  readonly onEdit: (edits: readonly LoadEdit[]) => void;
  readonly onClose: () => void;
  readonly onSticker: () => void;
};

/** One package: what it is, where it is, and everything that can be done with it. */
export function PackageSheet(props: PackageSheetProps) {
  const { view, packageId, mayBuild, problem, onEdit, onClose } = props;
  const { unitSystem } = useFacility();
  const [isTakingOff, setIsTakingOff] = useState(false);
  const entry = view.packages.find((one) => one.packageId === packageId);
  const item = entry && findItem(view, entry.itemId);
  if (!entry || !item) return null;
  const { placement } = entry;
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={item.name}
      size="wide"
      actions={
        mayBuild && (
          <>
            {isTakingOff ? (
              <Button
                kind="stop"
                onPress={() => {
                  onEdit([{ edit: 'take-off', packageId }]);
                }}
              >
                {entry.isScanned ? 'Yes, it is off the cart' : 'Yes, take it off the list'}
              </Button>
            ) : (
              <Button
                kind="quiet"
                icon="out"
                onPress={() => {
                  setIsTakingOff(true);
                }}
              >
                {entry.isScanned ? 'Take it off the load' : 'Take it off the list'}
              </Button>
            )}
            {entry.isScanned && (
              <Button kind="quiet" icon="print" onPress={props.onSticker}>
                Load sticker
              </Button>
            )}
            <Button kind="plain" onPress={onClose}>
              Done
            </Button>
          </>
        )
      }
    >
      <p className="text-body text-ink-2">
        <Code className="mr-3 font-semibold text-ink-1">{entry.code}</Code>
        {item.code}
        <span className="mx-2" />
        {formatSize([item.widthMm, item.lengthMm, item.heightMm], unitSystem)}
        <span className="mx-2" />
        {formatMass(item.massKg, unitSystem)}
        {item.isImplant && <b className="ml-3 font-semibold text-ink-1">Implant</b>}
      </p>
      <p className="mt-2 text-say font-label text-film-5" role="status">
        {placement
          ? placementWords(view, placement, item)
          : entry.isScanned
            ? 'Scanned, no place yet'
            : 'Listed, not scanned yet'}
      </p>
      {problem !== null && (
        <p role="alert" className="mt-2 bg-madder-1 px-3 py-2 text-row font-semibold text-madder-3">
          {problem}
        </p>
      )}
      {mayBuild && entry.isScanned && (
        <div className="mt-4 grid gap-5 tablet:grid-cols-2">
          <MoveIt {...props} entry={entry} item={item} />
          <div className="grid content-start gap-4">
            {placement && <TurnIt placement={placement} item={item} packageId={packageId} onEdit={onEdit} />}
            {placement && placement.at !== 'slot' && (
              <Nudge placement={placement} packageId={packageId} onEdit={onEdit} />
            )}
          </div>
        </div>
      )}
    </Dialog>
  );
}

function ChoiceRow({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div role="group" aria-label={label}>
      <p className="mb-1 text-small font-medium">{label}</p>
      <div className="flex flex-wrap gap-2">{children}</div>
    </div>
  );
}

const paperNames: Readonly<Record<PaperSide, string>> = {
  left: 'Paper left',
  right: 'Paper right',
  up: 'Paper up',
  down: 'Paper down',
};
const poseNames: Readonly<Record<Pose, string>> = { 'on-edge': 'On edge', flat: 'Flat', tilted: 'Tilted to drain' };

function posesOf(item: CatalogueItem): readonly Pose[] {
  switch (item.kind) {
    case 'pouch':
    case 'textile-pack':
      return ['on-edge', 'flat'];
    case 'basin':
      return ['tilted', 'flat'];
    case 'rigid-container':
    case 'wrapped-tray':
    case 'challenge-device':
      return ['flat', 'on-edge'];
  }
}

function TurnIt({
  placement,
  item,
  packageId,
  onEdit,
}: {
  placement: Placement;
  item: CatalogueItem;
  packageId: string;
  onEdit: (edits: readonly LoadEdit[]) => void;
}) {
  return (
    <>
      {hasPaperSide(item) && (
        <ChoiceRow label="Facing">
          {paperSidesOf(placement.pose).map((paper) => (
            <Button
              key={paper}
              kind={placement.paper === paper ? 'film' : 'quiet'}
              size="small"
              aria-pressed={placement.paper === paper}
              onPress={() => {
                if (placement.paper !== paper) onEdit([{ edit: 'turn-paper', packageId, paper }]);
              }}
            >
              {paperNames[paper]}
            </Button>
          ))}
        </ChoiceRow>
      )}
      {placement.at !== 'slot' && (
        <ChoiceRow label="How it stands">
          {posesOf(item).map((pose) => (
            <Button
              key={pose}
              kind={placement.pose === pose ? 'film' : 'quiet'}
              size="small"
              aria-pressed={placement.pose === pose}
              onPress={() => {
                if (placement.pose !== pose) onEdit([{ edit: 'set-pose', packageId, pose }]);
              }}
            >
              {poseNames[pose]}
            </Button>
          ))}
          <Button
            kind="quiet"
            size="small"
            icon="turn"
            onPress={() => {
              const turn: Turn = placement.turn === 0 ? 90 : 0;
              onEdit([{ edit: 'place', packageId, placement: { ...placement, turn } }]);
            }}
          >
            Quarter turn
          </Button>
        </ChoiceRow>
      )}
    </>
  );
}

const stepMm = 10;

const steps: readonly { readonly label: string; readonly icon: IconName; readonly dx: number; readonly dy: number }[] =
  [
    { label: 'Move 10 mm left', icon: 'left', dx: -stepMm, dy: 0 },
    { label: 'Move 10 mm right', icon: 'right', dx: stepMm, dy: 0 },
    { label: 'Move 10 mm towards the door', icon: 'down', dx: 0, dy: -stepMm },
    { label: 'Move 10 mm away from the door', icon: 'up', dx: 0, dy: stepMm },
  ];

function Nudge({
  placement,
  packageId,
  onEdit,
}: {
  placement: Exclude<Placement, { at: 'slot' }>;
  packageId: string;
  onEdit: (edits: readonly LoadEdit[]) => void;
}) {
  return (
    <ChoiceRow
      label={`Nudge: now ${Math.round(placement.xMm)} mm from the left, ${Math.round(placement.yMm)} mm from the door`}
    >
      {steps.map(({ label, icon, dx, dy }) => (
        <Button
          key={label}
          kind="quiet"
          size="small"
          aria-label={label}
          onPress={() => {
            onEdit([
              {
                edit: 'place',
                packageId,
                placement: { ...placement, xMm: mm(placement.xMm + dx), yMm: mm(placement.yMm + dy) },
              },
            ]);
          }}
        >
          <Icon name={icon} />
        </Button>
      ))}
    </ChoiceRow>
  );
}

/** Shelves, baskets and racks it could go to, the free slots of a rack, and the spot the core would choose there. */
function MoveIt({
  view,
  policy,
  layout,
  entry,
  item,
  onEdit,
}: PackageSheetProps & { entry: LoadPackage; item: CatalogueItem }) {
  const current = entry.placement;
  const [target, setTarget] = useState<string>(() =>
    current?.at === 'slot' || current?.at === 'basket'
      ? `holder ${current.holderId}`
      : `shelf ${view.cart.shelves[0]?.id ?? ''}`,
  );
  const [kind, id = ''] = target.split(' ');
  const holder = kind === 'holder' ? layout.holderOf.get(id) : undefined;
  const elsewhere = useMemo(
    () => ({
      ...view,
      packages: view.packages.map((one) => (one.packageId === entry.packageId ? { ...one, placement: null } : one)),
    }),
    [view, entry.packageId],
  );
  const suggestion = useMemo(() => {
    const [on, at = ''] = target.split(' ');
    const place = on === 'holder' ? { kind: 'holder' as const, holderId: at } : { kind: 'shelf' as const, shelfId: at };
    return suggestPlace(elsewhere, entry.packageId, policy, place);
  }, [elsewhere, entry.packageId, policy, target]);
  const paper = current?.paper ?? suggestion?.placement.paper ?? (hasPaperSide(item) ? 'left' : null);
  return (
    <div className="grid content-start gap-3">
      <SelectField
        label="Move it to"
        value={target}
        onChange={(event) => {
          setTarget(event.target.value);
        }}
        options={[
          ...view.cart.shelves.map((shelf) => ({ value: `shelf ${shelf.id}`, label: shelf.name })),
          ...view.holders.map((one) => ({
            value: `holder ${one.holderId}`,
            label: holderWords(one, findHolderKind(view, one)),
          })),
        ]}
      />
      {holder && (holder.kind.slots ?? 0) > 0 && (
        <ChoiceRow label="Free slots">
          {freeSlots(holder, layout.bodies).map((slot) => (
            <Button
              key={slot}
              kind="quiet"
              size="small"
              onPress={() => {
                onEdit([
                  {
                    edit: 'place',
                    packageId: entry.packageId,
                    placement: {
                      at: 'slot',
                      holderId: id,
                      slot,
                      pose: 'on-edge',
                      paper: paper === 'right' ? 'right' : 'left',
                    },
                  },
                ]);
              }}
            >
              {`Slot ${slot}`}
            </Button>
          ))}
        </ChoiceRow>
      )}
      <Button
        kind="film"
        blockedBecause={suggestion ? undefined : 'There is no free place for it there that the rules allow.'}
        onPress={() => {
          if (suggestion) onEdit([{ edit: 'place', packageId: entry.packageId, placement: suggestion.placement }]);
        }}
      >
        {suggestion ? `Put it at: ${placementWords(view, suggestion.placement, item)}` : 'No free place there'}
      </Button>
    </div>
  );
}
