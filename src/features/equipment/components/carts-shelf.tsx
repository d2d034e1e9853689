import type { CartOnFile } from '#contract/equipment';
import { paths } from '#contract/paths';
import { useQuery } from '@tanstack/react-query';
import { Fact, Facts } from '../../../components/stock/facts';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { Code } from '../../../components/ui/code';
import type { Column } from '../../../components/ui/data-table';
import { useFacility } from '../../../lib/facility';
import { formatLength, formatMass, formatSize } from '../../../lib/format';
import { sizeClassWords, surfaceWords } from '../equipment-words';
import { equipmentQueries } from '../queries';
import { CartDrawing } from './cart-drawing';
import { CartForm } from './cart-form';
import { ChangeButton } from './change-button';
import { EquipmentShelf } from './equipment-shelf';
import { PlaceLabelsButton } from './place-labels-button';

/** "2 shelves", "1 of 2 shelves", "Taken out" */
function shelvesInWords(cart: CartOnFile): string {
  if (!cart.isUsable) return 'Taken out';
  const usable = cart.shelves.filter((shelf) => shelf.isUsable).length;
  const all = cart.shelves.length;
  return usable === all ? `${all} ${all === 1 ? 'shelf' : 'shelves'}` : `${usable} of ${all} shelves`;
}

/** Carts and their shelves, with the place codes that are scanned at loading. */
export function CartsShelf() {
  const address = useShelfAddress();
  const query = useQuery(
    equipmentQueries.carts.list({ search: address.search, retired: 'hidden', page: address.page }),
  );

  function columns(isBesidePanel: boolean): readonly Column<CartOnFile>[] {
    const first: readonly Column<CartOnFile>[] = [
      { key: 'name', header: 'Cart', sortBy: (cart) => cart.name, cell: (cart) => cart.name },
      {
        key: 'code',
        header: 'Code',
        sortBy: (cart) => cart.code,
        cell: (cart) => <Code>{cart.code}</Code>,
        width: '6.5rem',
      },
      {
        key: 'use',
        header: 'In use',
        sortBy: shelvesInWords,
        cell: (cart) => (
          <span
            className={
              cart.isUsable && cart.shelves.every((shelf) => shelf.isUsable) ? '' : 'font-semibold text-straw-3'
            }
          >
            {shelvesInWords(cart)}
          </span>
        ),
      },
    ];
    if (isBesidePanel) return first;
    return [
      ...first,
      {
        key: 'size',
        header: 'Size',
        isWideOnly: true,
        sortBy: (cart) => cart.sizeClass,
        cell: (cart) => sizeClassWords[cart.sizeClass],
      },
      {
        key: 'places',
        header: 'Place codes',
        isWideOnly: true,
        cell: (cart) => (
          <span className="flex flex-wrap gap-x-4">
            {cart.shelves.map((shelf) => (
              <Code key={shelf.id}>{shelf.placeCode}</Code>
            ))}
          </span>
        ),
      },
      { key: 'note', header: 'Remark', isWideOnly: true, cell: (cart) => cart.note },
    ];
  }

  return (
    <EquipmentShelf
      address={address}
      query={query}
      path={paths.carts}
      things="carts"
      addWords="Add a cart"
      searchWords="Find by name, code or place code"
      rows={query.data?.carts ?? []}
      total={query.data?.total ?? 0}
      columns={columns}
      titleOf={(cart) => cart.name}
      panelOf={(cart, onChange) => <CartPanel cart={cart} onChange={onChange} />}
      formOf={(cart, onLeave) => <CartForm key={cart?.id ?? 'new'} cart={cart} onLeave={onLeave} />}
    />
  );
}

function CartPanel({ cart, onChange }: { cart: CartOnFile; onChange: () => void }) {
  const { unitSystem } = useFacility();
  return (
    <div className="grid gap-5">
      <p className="flex flex-wrap gap-x-3 text-row">
        <Code className="font-semibold">{cart.code}</Code>
        <span className="text-ink-2">{sizeClassWords[cart.sizeClass].toLowerCase()}</span>
        {!cart.isUsable && <span className="font-semibold text-straw-3">Taken out</span>}
      </p>
      {cart.note !== '' && <p className="text-row">{cart.note}</p>}
      <CartDrawing cart={cart} />
      {cart.shelves.toReversed().map((shelf) => (
        <section key={shelf.id} className="border-t border-paper-3 pt-3">
          <h3 className="mb-1.5 text-row font-semibold">
            {shelf.name}
            {!shelf.isUsable && <span className="ml-2 text-straw-3">Taken out</span>}
          </h3>
          <Facts>
            <Fact name="Place code">
              <Code>{shelf.placeCode}</Code>
            </Fact>
            <Fact name="Size">
              {formatSize([shelf.widthMm, shelf.depthMm], unitSystem)}
              <span className="block font-normal text-ink-2">width, depth</span>
            </Fact>
            <Fact name="Clear height">{formatLength(shelf.clearHeightMm, unitSystem)}</Fact>
            <Fact name="Made of">{surfaceWords[shelf.surface]}</Fact>
            <Fact name="Carries">at most {formatMass(shelf.greatestMassKg, unitSystem)}</Fact>
          </Facts>
        </section>
      ))}
      <span className="flex flex-wrap gap-2">
        <ChangeButton onPress={onChange} />
        <PlaceLabelsButton of={{ cartId: cart.id }}>Print its place labels</PlaceLabelsButton>
      </span>
    </div>
  );
}
