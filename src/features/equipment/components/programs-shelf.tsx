import type { ProgramOnFile } from '#contract/equipment';
import { paths } from '#contract/paths';
import { useQuery } from '@tanstack/react-query';
import { cycleTypeWords } from '../../../components/stock/cycle-words';
import { Fact, Facts } from '../../../components/stock/facts';
import { useShelfAddress } from '../../../components/stock/use-shelf-address';
import { Code } from '../../../components/ui/code';
import type { Column } from '../../../components/ui/data-table';
import { useFacility } from '../../../lib/facility';
import { formatDuration, formatMass, formatTemperature, listInWords } from '../../../lib/format';
import { equipmentQueries } from '../queries';
import { ChangeButton } from './change-button';
import { EquipmentShelf } from './equipment-shelf';
import { ProgramForm } from './program-form';

/** Cycle programs, and which sterilizers are qualified for each. */
export function ProgramsShelf() {
  const address = useShelfAddress();
  const { unitSystem } = useFacility();
  const query = useQuery(
    equipmentQueries.programs.list({
      search: address.search,
      retired: address.isRetiredShown ? 'shown' : 'hidden',
      page: address.page,
    }),
  );

  function columns(isBesidePanel: boolean): readonly Column<ProgramOnFile>[] {
    const first: readonly Column<ProgramOnFile>[] = [
      {
        key: 'code',
        header: 'Program',
        sortBy: (program) => program.code,
        cell: (program) => <Code className={program.isRetired ? 'line-through' : ''}>{program.code}</Code>,
        width: '7rem',
      },
      { key: 'name', header: 'Name', sortBy: (program) => program.name, cell: (program) => program.name },
    ];
    if (isBesidePanel) return first;
    return [
      ...first,
      {
        key: 'type',
        header: 'Type',
        isWideOnly: true,
        sortBy: (program) => program.type,
        cell: (program) => cycleTypeWords[program.type],
      },
      {
        key: 'temperature',
        header: 'Temperature',
        align: 'end',
        isWideOnly: true,
        sortBy: (program) => program.temperatureC,
        cell: (program) => formatTemperature(program.temperatureC, unitSystem),
      },
      {
        key: 'exposure',
        header: 'Exposure',
        align: 'end',
        isWideOnly: true,
        sortBy: (program) => program.exposureS,
        cell: (program) => formatDuration(program.exposureS),
      },
      {
        key: 'dry',
        header: 'Dry',
        align: 'end',
        isWideOnly: true,
        sortBy: (program) => program.dryS,
        cell: (program) => formatDuration(program.dryS),
      },
      { key: 'on', header: 'Qualified on', cell: (program) => <QualifiedOn codes={program.qualifiedOn} /> },
    ];
  }

  return (
    <EquipmentShelf
      address={address}
      query={query}
      path={paths.programs}
      things="programs"
      addWords="Add a program"
      searchWords="Find by code or name"
      retiredWords="Retired too"
      rows={query.data?.programs ?? []}
      total={query.data?.total ?? 0}
      columns={columns}
      titleOf={(program) => program.name}
      panelOf={(program, onChange) => (
        <div className="grid gap-5">
          <Facts>
            <Fact name="Code">
              <Code>{program.code}</Code>
            </Fact>
            <Fact name="Type">{cycleTypeWords[program.type]}</Fact>
            <Fact name="Temperature">{formatTemperature(program.temperatureC, unitSystem)}</Fact>
            <Fact name="Exposure">{formatDuration(program.exposureS)}</Fact>
            <Fact name="Dry">{program.dryS === 0 ? 'None' : formatDuration(program.dryS)}</Fact>
            <Fact name="Load mass">
              {program.greatestLoadMassKg === null
                ? 'What the sterilizer carries'
                : `at most ${formatMass(program.greatestLoadMassKg, unitSystem)}`}
            </Fact>
            <Fact name="Qualified on">
              <QualifiedOn codes={program.qualifiedOn} />
            </Fact>
            {program.isRetired && <Fact name="Retired">Yes</Fact>}
          </Facts>
          <ChangeButton onPress={onChange} />
        </div>
      )}
      formOf={(program, onLeave) => <ProgramForm key={program?.id ?? 'new'} program={program} onLeave={onLeave} />}
    />
  );
}

function QualifiedOn({ codes }: { codes: readonly string[] }) {
  return codes.length === 0 ? <span className="text-straw-3">No sterilizer</span> : <>{listInWords(codes)}</>;
}
