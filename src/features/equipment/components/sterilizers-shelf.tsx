import type { SterilizerOnFile } from '#contract/equipment';
import { paths } from '#contract/paths';
import { useQuery } from '@tanstack/react-query';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { Code } from '../../../components/ui/code';
import type { Column } from '../../../components/ui/data-table';
import { useFacility } from '../../../lib/facility';
import { formatMass } from '../../../lib/format';
import { equipmentQueries } from '../queries';
import { EquipmentShelf } from './equipment-shelf';
import { SterilizerForm } from './sterilizer-form';
import { AirRemovalWords, ServiceStateWords, SterilizerPanel } from './sterilizer-panel';

/** The sterilizers: whether each may be used today, and what it is qualified for. */
export function SterilizersShelf() {
  const address = useShelfAddress();
  const { unitSystem } = useFacility();
  const query = useQuery(
    equipmentQueries.sterilizers.list({ search: address.search, retired: 'hidden', page: address.page }),
  );

  function columns(isBesidePanel: boolean): readonly Column<SterilizerOnFile>[] {
    const first: readonly Column<SterilizerOnFile>[] = [
      { key: 'name', header: 'Sterilizer', sortBy: (one) => one.name, cell: (one) => one.name },
      {
        key: 'code',
        header: 'Code',
        sortBy: (one) => one.code,
        cell: (one) => <Code>{one.code}</Code>,
        width: '6.5rem',
      },
      {
        key: 'air',
        header: 'Air-removal test today',
        cell: (one) => <AirRemovalWords sterilizer={one} />,
      },
    ];
    if (isBesidePanel) return first;
    return [
      ...first,
      {
        key: 'state',
        header: 'Service',
        isWideOnly: true,
        sortBy: (one) => one.serviceState,
        cell: (one) => <ServiceStateWords state={one.serviceState} />,
      },
      { key: 'programs', header: 'Qualified for', isWideOnly: true, cell: (one) => one.qualifiedPrograms.join(', ') },
      {
        key: 'mass',
        header: 'Greatest load',
        align: 'end',
        isWideOnly: true,
        sortBy: (one) => one.greatestLoadMassKg,
        cell: (one) => formatMass(one.greatestLoadMassKg, unitSystem),
      },
    ];
  }

  return (
    <EquipmentShelf
      address={address}
      query={query}
      path={paths.sterilizers}
      things="sterilizers"
      addWords="Add a sterilizer"
      searchWords="Find by name, code or steam line"
      rows={query.data?.sterilizers ?? []}
      total={query.data?.total ?? 0}
      columns={columns}
      titleOf={(one) => one.name}
      panelOf={(one, onChange) => <SterilizerPanel sterilizer={one} onChange={onChange} />}
      formOf={(one, onLeave) => <SterilizerForm key={one?.id ?? 'new'} sterilizer={one} onLeave={onLeave} />}
    />
  );
}
