import type { LoadDetail } from '#contract/loads';
import type { Layout } from '#domain/load/layout';
import { useMemo } from 'react';
import { CartElevation, elevationHeight, elevationWidth } from '../../../components/cart-map/cart-elevation';
import { HolderCloseUp } from '../../../components/cart-map/holder-close-up';
import { nextPlaceOf, type LetteredFinding } from '../../../components/cart-map/map-model';
import { planWidth, ShelfPlan } from '../../../components/cart-map/shelf-plan';
import { PanelHead } from '../../../components/ui/heading';
import type { Size } from '../../../lib/use-size';
import type { Reckoning } from '#domain/load/reckoning';
import { ReckoningPanel } from './reckoning-panel';
import type { LastScan } from './scan-line';

const headPx = 28;
/** Greatest scale, px per mm: beyond it a drawing only grows, and says no more. */
const greatestScale = 0.52;
const leastCloseUpPx = 178;
/** The words over the plan take this much, however narrow the shelf is drawn. */
const leastPlanPx = 258;

export type MapFocus = { readonly shelfId: string | null; readonly holderId: string | null };

type LoadMapProps = {
  readonly detail: LoadDetail;
  readonly layout: Layout;
  readonly open: readonly LetteredFinding[];
  readonly reckoning: Reckoning;
  readonly last: LastScan;
  readonly focus: MapFocus;
  readonly openKey: string | null;
  readonly pickedPackageId: string | null;
  /** Of the part of the screen that is left for the drawings. */
  readonly size: Size;
  readonly isPhone: boolean;
  readonly onShelf: (shelfId: string) => void;
  readonly onHolder: (holderId: string) => void;
  readonly onPackage: (packageId: string) => void;
  readonly onCount: ((shelfId: string) => void) | null;
};

/** Elevation and plan share one scale, computed from the room there is. */
function scaleFor({ detail, size, isPhone }: LoadMapProps): number {
  const { view } = detail;
  const deepest = Math.max(...view.cart.shelves.map((shelf) => shelf.depthMm), 1);
  const widest = Math.max(...view.cart.shelves.map((shelf) => shelf.widthMm), view.sterilizer.chamberWidthMm);
  if (isPhone) return Math.min((size.width - 20) / widest, greatestScale);
  const perMm = elevationHeight(view, 1) - elevationHeight(view, 0);
  const besides = elevationHeight(view, 0);
  const byHeight = (size.height - headPx - 40) / deepest;
  const byElevation = (size.height - 2 * headPx - leastCloseUpPx - 8 - besides) / perMm;
  const byWidth = (size.width - 230 - 40) / (2 * widest);
  return Math.max(0.16, Math.min(byHeight, byElevation, byWidth, greatestScale));
}

/** The cart, three ways: from the door end with its reckoning, one rack close up, one shelf from above. */
export function LoadMap(props: LoadMapProps) {
  const { detail, layout, open, last, focus, openKey, size, isPhone } = props;
  const { view, policy } = detail;
  const scale = scaleFor(props);
  const taken = last.kind === 'answered' && last.reply.answer === 'taken' ? last.reply.package?.id : undefined;
  const next = useMemo(() => {
    const entry = view.packages.find((one) => one.packageId === taken);
    const item = entry && view.items.find((one) => one.id === entry.itemId);
    return entry ? nextPlaceOf(layout, entry.placement, item) : null;
  }, [layout, taken, view]);
  const shelf = view.cart.shelves.find((one) => one.id === focus.shelfId) ?? view.cart.shelves[0];
  // Where nobody looks at a rack, the first one keeps its place on the screen: nothing jumps.
  const racks = layout.holders.filter((one) => one.kind.form === 'rack');
  const holder = focus.holderId === null ? racks[0] : layout.holderOf.get(focus.holderId);
  const inHolder = useMemo(
    () => (holder ? layout.bodies.filter((body) => body.holder === holder) : []),
    [holder, layout],
  );
  if (!shelf) return null;
  const planWide = Math.max(planWidth(shelf, scale), leastPlanPx);

  const elevation = (
    <CartElevation
      view={view}
      layout={layout}
      findings={open}
      scale={scale}
      activeShelfId={shelf.id}
      openFindingKey={openKey}
      next={next}
      onShelf={props.onShelf}
    />
  );
  const reckoning = (
    <ReckoningPanel
      detail={detail}
      reckoning={props.reckoning}
      activeShelfId={shelf.id}
      onShelf={props.onShelf}
      onCount={props.onCount}
    />
  );
  const plan = (
    <div className="flex-none" style={isPhone ? {} : { width: planWide }}>
      <PanelHead title={`${shelf.name}, from above`} aside={`${shelf.depthMm} mm`} />
      <ShelfPlan
        view={view}
        layout={layout}
        shelf={shelf}
        findings={open}
        scale={scale}
        keepClearMm={Math.max(0, policy.wallClearanceMm - (view.sterilizer.chamberWidthMm - shelf.widthMm) / 2)}
        openFindingKey={openKey}
        next={next}
        activeHolderId={focus.holderId}
        pickedPackageId={props.pickedPackageId}
        onPackage={props.onPackage}
        onHolder={props.onHolder}
      />
    </div>
  );
  const elevationWide = elevationWidth(view, scale);
  const leftWide = isPhone ? size.width : size.width - planWide - 20;
  const closeUpHigh = isPhone ? 220 : Math.min(260, size.height - 2 * headPx - elevationHeight(view, scale) - 8);
  const closeUp = holder && (holder.kind.slots ?? 0) > 0 && (
    <div>
      <PanelHead title={`${holder.holder.name}, close up`} aside="touch a slot to see or move its pouch" />
      <HolderCloseUp
        holder={holder}
        bodies={inHolder}
        findings={open}
        width={leftWide}
        height={Math.max(leastCloseUpPx, closeUpHigh)}
        nextSlot={
          next?.placement.at === 'slot' && next.placement.holderId === holder.holder.holderId
            ? next.placement.slot
            : null
        }
        nextName={null}
        nextPaper={null}
        openFindingKey={openKey}
        onSlot={(_slot, packageId) => {
          if (packageId !== null) props.onPackage(packageId);
        }}
      />
    </div>
  );
  const noHolder = !closeUp && view.holders.length === 0 && (
    <p className="max-w-96 border border-dashed border-paper-edge px-4 py-3 text-row text-ink-2">
      No holder is on this cart yet. Scan the code of a holder to put it on the shelf and scan pouches into it.
    </p>
  );

  return isPhone ? (
    <div className="grid gap-4">
      {reckoning}
      {elevation}
      {plan}
      {closeUp}
      {noHolder}
    </div>
  ) : (
    <div className="flex h-full min-h-0 gap-5">
      <div className="flex min-w-0 flex-1 flex-col gap-2">
        <PanelHead title={`${view.cart.name}, from the door end`} aside={`drawn to scale, ${shelf.widthMm} mm wide`} />
        <div className="flex gap-2">
          <div className="flex-none" style={{ width: elevationWide }}>
            {elevation}
          </div>
          <div className="min-w-0 flex-1">{reckoning}</div>
        </div>
        {closeUp}
        {noHolder}
      </div>
      {plan}
    </div>
  );
}
