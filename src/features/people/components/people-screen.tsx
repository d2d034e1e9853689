import type { Person } from '#contract/people';
import { roles, type Role } from '#domain/access/permissions';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { Button } from '../../../components/ui/button';
import { PageHead } from '../../../components/ui/heading';
import { SearchField } from '../../../components/ui/search-field';
import { SelectField } from '../../../components/ui/select-field';
import { EmptyState, WaitingState, WrongState } from '../../../components/ui/states';
import { countOf } from '../../../lib/format';
import { roleWords } from '#domain/access/role-words';
import { useMay } from '../../../lib/session';
import { useAddress } from '../../../lib/use-address';
import { useNow } from '../../../lib/use-now';
import { isMeant, isOpen } from '../person-words';
import { everyone, peopleQueries } from '../queries';
import { AddPersonDialog } from './add-person-dialog';
import { PeopleTable } from './people-table';
import { PersonPanel } from './person-panel';
import { ShownOnceDialog, type ShownOnce } from './shown-once-dialog';

const roleOptions = [
  { value: '', label: 'Every role' },
  ...roles.map((role) => ({ value: role, label: roleWords[role] })),
];

function roleOf(text: string | null): Role | null {
  return roles.find((role) => role === text) ?? null;
}

/** Who works here, and as what. Search, role and the open person live in the address. */
export function PeopleScreen() {
  const people = useQuery(peopleQueries.list(everyone));
  const mayEdit = useMay('people.edit');
  const now = useNow();
  const [isAdding, setIsAdding] = useState(false);
  const [shown, setShown] = useState<ShownOnce | null>(null);
  const { search, role, personId, setSearch, setRole, setPersonId, showEverybody } = usePeopleAddress();
  const rowBefore = useRef<HTMLElement | null>(null);

  useEffect(() => {
    if (personId === null) rowBefore.current?.focus();
  }, [personId]);

  if (people.isPending) return <WaitingState title="People" waitsFor="The server has not answered yet." />;
  if (people.isError) {
    return (
      <div className="p-6">
        <WrongState
          title="The people could not be shown"
          error={people.error}
          onTryAgain={() => void people.refetch()}
        />
      </div>
    );
  }

  const meant = people.data.filter((one) => isMeant(one, search) && (role === null || one.role === role));
  const chosen = people.data.find((one) => one.id === personId) ?? null;
  const open = people.data.filter((one) => isOpen(one, now)).length;

  function openPerson(person: Person) {
    rowBefore.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
    setPersonId(person.id);
  }

  return (
    <div className="grid gap-5 px-6 py-5 max-tablet:px-4">
      <title>People · Paperside</title>
      <PageHead
        title="People"
        facts={`${countOf(people.data.length, 'person', 'people')}, ${open} with an open sign-in`}
        {...(mayEdit
          ? {
              aside: (
                <Button
                  icon="plus"
                  onPress={() => {
                    setIsAdding(true);
                  }}
                >
                  Add a person
                </Button>
              ),
            }
          : {})}
      />
      <div className={`flex flex-wrap items-end gap-3 ${chosen === null ? '' : 'max-tablet:hidden'}`}>
        <SearchField
          label="Find by name, initials or staff number"
          value={search}
          onChange={setSearch}
          result={`${meant.length} of ${people.data.length}`}
          className="min-w-64 flex-1"
        />
        <SelectField
          label="Role"
          isLabelHidden
          options={roleOptions}
          value={role ?? ''}
          onChange={(event) => {
            setRole(roleOf(event.target.value));
          }}
          className="w-52 max-tablet:w-full"
        />
      </div>
      <div className={chosen === null ? '' : 'grid gap-9 tablet:grid-cols-[minmax(0,1fr)_22rem]'}>
        <div className={chosen === null ? '' : 'max-tablet:hidden'}>
          <PeopleTable
            people={meant}
            chosenId={personId}
            isBesidePanel={chosen !== null}
            onOpen={openPerson}
            empty={
              <EmptyState
                title="Nobody like that here"
                act={
                  <Button size="small" kind="quiet" onPress={showEverybody}>
                    Show everybody
                  </Button>
                }
              />
            }
          />
        </div>
        {chosen !== null && (
          <PersonPanel
            person={chosen}
            onClose={() => {
              setPersonId(null);
            }}
            onShown={setShown}
          />
        )}
      </div>
      <AddPersonDialog
        isOpen={isAdding}
        onClose={() => {
          setIsAdding(false);
        }}
        onAdded={(added) => {
          setIsAdding(false);
          setShown(added.shown);
          setPersonId(added.personId);
        }}
      />
      <ShownOnceDialog
        shown={shown}
        onClose={() => {
          setShown(null);
        }}
      />
    </div>
  );
}

/** The address keeps all three, so that a page loaded again shows the same. */
function usePeopleAddress() {
  const { params, write } = useAddress();
  return {
    search: params.get('search') ?? '',
    role: roleOf(params.get('role')),
    personId: params.get('person'),
    setSearch: (text: string) => {
      write({ search: text });
    },
    setRole: (role: Role | null) => {
      write({ role });
    },
    setPersonId: (id: string | null) => {
      write({ person: id });
    },
    showEverybody: () => {
      write({ search: null, role: null });
    },
  };
}
