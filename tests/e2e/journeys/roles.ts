import assert from 'node:assert/strict';
import { demonstrationSignIns } from '../../../seeds/demonstration-people';
import type { Role } from '../../../src/domain/access/permissions';
import { signInPage } from '../pages/sign-in-page';
import type { Journey } from '../support/journey';
import { see, seeGone } from '../support/see';

type Sees = {
  readonly rail: readonly string[];
  /** Buttons that are there on the lists of loads, items and people. */
  readonly mayOpenLoads: boolean;
  readonly mayAddItems: boolean;
  readonly mayAddPeople: boolean;
};

const looking = { mayOpenLoads: false, mayAddItems: false, mayAddPeople: false } as const;

/** Who sees what, written down apart from the program's own table. */
const expected: Readonly<Record<Role, Sees>> = {
  technician: { ...looking, rail: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy'], mayOpenLoads: true },
  lead: {
    ...looking,
    rail: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy'],
    mayOpenLoads: true,
    mayAddItems: true,
  },
  supervisor: {
    ...looking,
    rail: ['Today', 'Load', 'Pack', 'Lessons', 'Stock', 'Policy', 'People'],
    mayOpenLoads: true,
    mayAddItems: true,
  },
  'infection-prevention': { ...looking, rail: ['Today', 'Load', 'Lessons', 'Stock', 'Policy'] },
  'operating-room': { ...looking, rail: ['Today', 'Load', 'Lessons', 'Stock'] },
  engineer: { ...looking, rail: ['Today', 'Load', 'Lessons', 'Stock', 'Policy'] },
  surveyor: { ...looking, rail: ['Today', 'Load', 'Lessons', 'Stock', 'Policy', 'People'] },
  administrator: {
    mayOpenLoads: false,
    rail: ['Today', 'Load', 'Lessons', 'Stock', 'Policy', 'People'],
    mayAddItems: true,
    mayAddPeople: true,
  },
};

const addresses: Readonly<Record<string, string>> = {
  Load: '/loads',
  Pack: '/pack/station',
  Lessons: '/lessons',
  Stock: '/stock',
  Policy: '/policy',
  People: '/people',
};

export const roles: Journey = {
  name: 'Every role signs in and finds what it may do, and nothing else',
  async run(stage) {
    for (const person of demonstrationSignIns) {
      const sees = expected[person.role];
      const station = await stage.openStation({
        // What a screen shows is asked for while it is found out whether the person may see it.
        expected: [{ method: 'GET', path: /^\/api\/(people|policies)$/, status: 403 }],
      });
      await signInPage(station).signIn(person);
      const rail = station.getByRole('navigation', { name: 'Main' }).filter({ visible: true });
      assert.deepEqual(await rail.getByRole('link').allInnerTexts(), sees.rail, person.role);

      for (const [place, address] of Object.entries(addresses)) {
        await station.goto(address);
        const isOpen = sees.rail.includes(place);
        const refusal = station.getByText('This screen is for another role');
        if (isOpen) {
          await see(station.getByRole('heading', { level: 1 }));
          await seeGone(refusal);
        } else await see(refusal);
        const acts: readonly (readonly [string, boolean])[] =
          place === 'Load'
            ? [['Open a load', sees.mayOpenLoads]]
            : place === 'Stock' && person.role !== 'engineer'
              ? [['Add an item', sees.mayAddItems]]
              : place === 'People'
                ? [['Add a person', sees.mayAddPeople]]
                : [];
        for (const [name, isThere] of acts) {
          const button = station.getByRole('button', { name });
          if (isThere) await see(button);
          else assert.equal(await button.count(), 0, `${person.role} is offered “${name}”`);
        }
      }
      await station.context().close();
    }
  },
};
