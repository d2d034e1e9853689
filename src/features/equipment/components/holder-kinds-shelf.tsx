import type { HolderKindOnFile } from '#contract/equipment';
import { paths } from '#contract/paths';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Fact, Facts } from '../../../components/stock/facts';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { Code } from '../../../components/ui/code';
import type { Column } from '../../../components/ui/data-table';
import { useFacility } from '../../../lib/facility';
import { formatLength, formatMass, formatSize } from '../../../lib/format';
import { formWords } from '../equipment-words';
import { equipmentQueries } from '../queries';
import { ChangeButton } from './change-button';
import { EquipmentShelf } from './equipment-shelf';
import { HolderKindForm } from './holder-kind-form';
import { PlaceLabelsButton } from './place-labels-button';
import { RackDrawing } from './rack-drawing';

/** Kinds of holders: what each takes, and how many there are. */
export function HolderKindsShelf() {
  const address = useShelfAddress();
  const { unitSystem } = useFacility();
  const query = useQuery(
    equipmentQueries.holderKinds.list({ search: address.search, retired: 'hidden', page: address.page }),
  );

  function columns(isBesidePanel: boolean): readonly Column<HolderKindOnFile>[] {
    const first: readonly Column<HolderKindOnFile>[] = [
      { key: 'name', header: 'Kind', sortBy: (kind) => kind.name, cell: (kind) => kind.name },
      {
        key: 'code',
        header: 'Code',
        sortBy: (kind) => kind.code,
        cell: (kind) => <Code>{kind.code}</Code>,
        width: '6.5rem',
      },
      {
        key: 'good',
        header: 'In good order',
        align: 'end',
        sortBy: (kind) => kind.inGoodOrder,
        cell: (kind) => `${kind.inGoodOrder} of ${kind.owned}`,
      },
    ];
    if (isBesidePanel) return first;
    return [
      ...first,
      {
        key: 'form',
        header: 'Form',
        isWideOnly: true,
        sortBy: (kind) => kind.form,
        cell: (kind) => formWords[kind.form],
      },
      {
        key: 'slots',
        header: 'Slots',
        align: 'end',
        isWideOnly: true,
        sortBy: (kind) => kind.slots ?? 0,
        cell: (kind) => kind.slots ?? '',
      },
      {
        key: 'pitch',
        header: 'Pitch',
        align: 'end',
        isWideOnly: true,
        sortBy: (kind) => kind.pitchMm ?? 0,
        cell: (kind) => (kind.pitchMm === null ? '' : formatLength(kind.pitchMm, unitSystem)),
      },
      {
        key: 'takes',
        header: 'Greatest pouch',
        align: 'end',
        isWideOnly: true,
        cell: (kind) => greatestPouch(kind, unitSystem),
      },
    ];
  }

  return (
    <EquipmentShelf
      address={address}
      query={query}
      path={paths.holderKinds}
      things="kinds of holders"
      addWords="Add a kind"
      searchWords="Find by name or code"
      rows={query.data?.holderKinds ?? []}
      total={query.data?.total ?? 0}
      columns={columns}
      titleOf={(kind) => kind.name}
      panelOf={(kind, onChange) => (
        <div className="grid gap-5">
          <p className="flex flex-wrap gap-x-3 text-row">
            <Code className="font-semibold">{kind.code}</Code>
            <span className="text-ink-2">{formWords[kind.form].toLowerCase()}</span>
          </p>
          <RackDrawing kind={kind} />
          <Facts>
            {kind.slots !== null && <Fact name="Slots">{kind.slots}</Fact>}
            {kind.pitchMm !== null && <Fact name="Pitch">{formatLength(kind.pitchMm, unitSystem)}</Fact>}
            {kind.form === 'rack' && (
              <Fact name="Greatest pouch">
                {greatestPouch(kind, unitSystem)}
                <span className="block font-normal text-ink-2">height, length, thickness</span>
              </Fact>
            )}
            <Fact name="Its own size">
              {formatSize([kind.acrossMm, kind.alongMm], unitSystem)}
              <span className="block font-normal text-ink-2">across, along</span>
            </Fact>
            <Fact name="Its own mass">{formatMass(kind.massKg, unitSystem)}</Fact>
            <Fact name="Owned">
              {kind.owned}, {kind.coded} with a place code
            </Fact>
          </Facts>
          <Link to={`/stock/holders?search=${encodeURIComponent(kind.code)}`} className="text-row">
            Its holders, one by one
          </Link>
          <span className="flex flex-wrap gap-2">
            <ChangeButton onPress={onChange} />
            {kind.coded > 0 && (
              <PlaceLabelsButton of={{ holderKindId: kind.id }}>Print their place labels</PlaceLabelsButton>
            )}
          </span>
        </div>
      )}
      formOf={(kind, onLeave) => <HolderKindForm key={kind?.id ?? 'new'} kind={kind} onLeave={onLeave} />}
    />
  );
}

function greatestPouch(kind: HolderKindOnFile, unitSystem: 'metric' | 'us-customary'): string {
  const { greatestHeightMm, greatestLengthMm, greatestThicknessMm } = kind;
  if (greatestHeightMm === null || greatestLengthMm === null || greatestThicknessMm === null) return '';
  return formatSize([greatestHeightMm, greatestLengthMm, greatestThicknessMm], unitSystem);
}
