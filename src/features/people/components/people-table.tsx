import type { Person } from '#contract/people';
import type { ReactNode } from 'react';
import { Code } from '../../../components/ui/code';
import { DataTable, type Column } from '../../../components/ui/data-table';
import { useFacility } from '../../../lib/facility';
import { roleWords } from '#domain/access/role-words';
import { useNow } from '../../../lib/use-now';
import { badgeWords, signInWords } from '../person-words';

type PeopleTableProps = {
  people: readonly Person[];
  chosenId: string | null;
  /** Leaves out what the panel beside it tells. */
  isBesidePanel: boolean;
  onOpen: (person: Person) => void;
  empty: ReactNode;
};

export function PeopleTable({ people, chosenId, isBesidePanel, onOpen, empty }: PeopleTableProps) {
  const { timeZone } = useFacility();
  const now = useNow();
  const name: Column<Person> = {
    key: 'name',
    header: 'Name',
    cell: (person) => person.displayName,
    sortBy: (person) => person.displayName,
  };
  const beside: readonly Column<Person>[] = [
    {
      key: 'shift',
      header: 'Usual shift',
      cell: (person) => person.usualShift ?? '',
      sortBy: shiftOf,
      isWideOnly: true,
    },
    { key: 'badge', header: 'Badge', cell: badgeWords, sortBy: badgeWords, isWideOnly: true },
  ];
  const columns: readonly Column<Person>[] = [
    name,
    {
      key: 'number',
      header: 'Staff number',
      cell: (person) => <Code>{person.staffNumber}</Code>,
      sortBy: (person) => person.staffNumber,
      isWideOnly: true,
    },
    {
      key: 'role',
      header: 'Role',
      cell: (person) => roleWords[person.role],
      sortBy: (person) => roleWords[person.role],
    },
    ...(isBesidePanel ? [] : beside),
    {
      key: 'sign-in',
      header: 'Sign-in',
      cell: (person) => signInWords(person, { now, timeZone }),
      sortBy: (person) => signInWords(person, { now, timeZone }),
    },
  ];
  return (
    <DataTable
      label="People"
      columns={columns}
      rows={people}
      keyOf={(person) => person.id}
      onOpen={onOpen}
      chosenKey={chosenId}
      empty={empty}
      sortedBy={{ key: 'name', isDown: false }}
    />
  );
}

function shiftOf(person: Person): string {
  return person.usualShift ?? '';
}
