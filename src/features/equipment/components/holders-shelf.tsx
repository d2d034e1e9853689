import type { HolderOnFile } from '#contract/equipment';
import { paths } from '#contract/paths';
import { holderConditions } from '#domain/catalogue/equipment-fields';
import { useQuery } from '@tanstack/react-query';
import { Fact, Facts } from '../../../components/stock/facts';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Code } from '../../../components/ui/code';
import type { Column } from '../../../components/ui/data-table';
import { RadioGroupField } from '../../../components/ui/radio-group-field';
import { sentenceOf } from '../../../lib/errors';
import { useMay } from '../../../lib/session';
import { conditionWords, optionsOf } from '../equipment-words';
import { useKeepHolder } from '../mutations';
import { equipmentQueries } from '../queries';
import { EquipmentShelf } from './equipment-shelf';
import { HolderForm } from './holder-form';
import { PlaceLabelsButton } from './place-labels-button';

/** The holders one by one: each has a place code of its own and is in some condition. */
export function HoldersShelf() {
  const address = useShelfAddress();
  const query = useQuery(
    equipmentQueries.holders.list({
      search: address.search,
      retired: address.isRetiredShown ? 'shown' : 'hidden',
      page: address.page,
    }),
  );

  function columns(isBesidePanel: boolean): readonly Column<HolderOnFile>[] {
    const first: readonly Column<HolderOnFile>[] = [
      {
        key: 'name',
        header: 'Holder',
        sortBy: (holder) => holder.name,
        cell: (holder) => <Code>{holder.name}</Code>,
        width: '8rem',
      },
      { key: 'place', header: 'Place code', cell: (holder) => <Code>{holder.placeCode}</Code> },
      {
        key: 'condition',
        header: 'Condition',
        sortBy: (holder) => conditionWords[holder.condition],
        cell: (holder) => (
          <span className={holder.condition === 'good' ? '' : 'font-semibold text-straw-3'}>
            {conditionWords[holder.condition]}
          </span>
        ),
      },
    ];
    if (isBesidePanel) return first;
    return [
      ...first,
      {
        key: 'kind',
        header: 'Kind',
        isWideOnly: true,
        sortBy: (holder) => holder.kindName,
        cell: (holder) => holder.kindName,
      },
    ];
  }

  return (
    <EquipmentShelf
      address={address}
      query={query}
      path={paths.holders}
      things="holders"
      addWords="Add a holder"
      searchWords="Find by name, place code or kind"
      retiredWords="Missing too"
      rows={query.data?.holders ?? []}
      total={query.data?.total ?? 0}
      columns={columns}
      titleOf={(holder) => holder.name}
      panelOf={(holder) => <HolderPanel holder={holder} />}
      formOf={(_holder, onLeave) => <HolderForm onLeave={onLeave} />}
    />
  );
}

function HolderPanel({ holder }: { holder: HolderOnFile }) {
  const mayEdit = useMay('equipment.edit');
  const keep = useKeepHolder();
  const write = useWrite();
  const announce = useAnnounce();

  async function setCondition(condition: HolderOnFile['condition']) {
    try {
      await write((requestId) => keep.change(holder.id, { requestId, version: holder.version, condition }));
      announce(`${holder.name}: ${conditionWords[condition].toLowerCase()}.`);
    } catch {
      // What was refused is shown below, from the mutation itself.
    }
  }

  return (
    <div className="grid gap-5">
      <Facts>
        <Fact name="Place code">
          <Code>{holder.placeCode}</Code>
        </Fact>
        <Fact name="Kind">
          {holder.kind}, {holder.kindName}
        </Fact>
        {!mayEdit && <Fact name="Condition">{conditionWords[holder.condition]}</Fact>}
      </Facts>
      <PlaceLabelsButton of={{ holderId: holder.id }}>Print its place label</PlaceLabelsButton>
      {mayEdit && (
        <RadioGroupField
          label="Condition"
          name="condition"
          options={optionsOf(holderConditions, conditionWords)}
          value={holder.condition}
          hint="One that is in repair or missing is not offered at loading."
          error={keep.error === null ? undefined : sentenceOf(keep.error)}
          onChange={(event) => {
            const condition = holderConditions.find((one) => one === event.target.value);
            if (condition !== undefined && !keep.isPending) void setCondition(condition);
          }}
        />
      )}
    </div>
  );
}
