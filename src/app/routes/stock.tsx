import type { Permission } from '#domain/access/permissions';
import type { ComponentType } from 'react';
import { useParams } from 'react-router-dom';
import { PageHead } from '../../components/ui/heading';
import { TabLinks } from '../../components/ui/tabs';
import { AirRemovalScreen } from '../../features/air-removal-tests/components/air-removal-screen';
import { CartsShelf } from '../../features/equipment/components/carts-shelf';
import { HolderKindsShelf } from '../../features/equipment/components/holder-kinds-shelf';
import { HoldersShelf } from '../../features/equipment/components/holders-shelf';
import { ProgramsShelf } from '../../features/equipment/components/programs-shelf';
import { SterilizersShelf } from '../../features/equipment/components/sterilizers-shelf';
import { ItemsShelf } from '../../features/items/components/items-shelf';
import { useSession } from '../../lib/session';
import { NotFound } from '../not-found';

type Shelf = {
  readonly name: string;
  readonly label: string;
  readonly permission: Permission;
  readonly Content: ComponentType;
};

const shelves: readonly Shelf[] = [
  { name: 'items', label: 'Items', permission: 'item.view', Content: ItemsShelf },
  { name: 'sterilizers', label: 'Sterilizers', permission: 'equipment.view', Content: SterilizersShelf },
  { name: 'programs', label: 'Programs', permission: 'equipment.view', Content: ProgramsShelf },
  { name: 'carts', label: 'Carts', permission: 'equipment.view', Content: CartsShelf },
  { name: 'holders', label: 'Holders', permission: 'equipment.view', Content: HoldersShelf },
  { name: 'holder-kinds', label: 'Kinds of holders', permission: 'equipment.view', Content: HolderKindsShelf },
];

/** What a load is built from, shelf by shelf. */
export function Component() {
  const { shelf: name } = useParams();
  const { permissions } = useSession();
  const mine = shelves.filter((shelf) => permissions.includes(shelf.permission));
  if (name === 'air-removal' && permissions.includes('equipment.view')) return <AirRemovalScreen />;
  const shelf = mine.find((one) => one.name === name);
  if (shelf === undefined) return <NotFound sentence="There is no such shelf in the stock." />;
  const { Content } = shelf;
  return (
    <div className="flex min-h-full flex-col">
      <title>{`${shelf.label} · Stock · Paperside`}</title>
      <div className="px-6 pt-5 max-tablet:px-4 has-[~form]:hidden">
        <PageHead title="Stock" />
        <div className="mt-3">
          <TabLinks label="Stock" links={mine.map((one) => ({ to: `/stock/${one.name}`, label: one.label }))} />
        </div>
      </div>
      <Content key={shelf.name} />
    </div>
  );
}
