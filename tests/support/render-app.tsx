import { permissionsOf } from '#domain/access/role-matrix';
import type { Role } from '#domain/access/permissions';
import type { SessionResponse } from '#contract/session';
import { render } from '@testing-library/react';
import userEvent, { PointerEventsCheckLevel } from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { createMemoryRouter, RouterProvider, type RouteObject } from 'react-router-dom';
import { Providers } from '../../src/app/providers';
import { createRoutes } from '../../src/app/router';
import { createServices } from '../../src/app/services';
import { signedOutGate } from '../../src/lib/signed-out-gate';

/** An invented person at an invented place. */
export function aSession(role: Role = 'technician', changes: Partial<SessionResponse['person']> = {}): SessionResponse {
  return {
    person: {
      id: '0190f000-0000-7000-8000-000000000001',
      displayName: 'Dele Oyelaran',
      initials: 'DO',
      staffNumber: '4471',
      role,
      mustChangePassword: false,
      hasBadge: true,
      hasPin: true,
      ...changes,
    },
    facility: {
      id: '0190f000-0000-7000-8000-0000000000f1',
      name: 'Hillcrest General',
      timeZone: 'Europe/London',
      unitSystem: 'metric',
    },
    facilities: [{ id: '0190f000-0000-7000-8000-0000000000f1', name: 'Hillcrest General' }],
    permissions: [...permissionsOf(role)],
    idleTimeoutSeconds: 600,
    expiresAt: '2030-01-01T00:00:00.000Z',
  };
}

export const nobody = { problem: 'session.none', status: 401, detail: 'Nobody is signed in here.' } as const;

/** Hands that lose no time between keys; what covers what is for the browser to test, and slow to compute here. */
function setUpHands() {
  return userEvent.setup({ delay: null, pointerEventsCheck: PointerEventsCheckLevel.Never });
}

/** A component with everything it may ask for above it. */
export function renderPart(part: ReactNode, path = '/') {
  const services = createServices();
  const router = createMemoryRouter([{ path: '*', element: part }], { initialEntries: [path] });
  const user = setUpHands();
  const view = render(
    <Providers services={services}>
      <RouterProvider router={router} />
    </Providers>,
  );
  return { ...view, services, router, user };
}

/** The whole client at an address. `replace` swaps the screens below the frame for simpler ones. */
export function renderApp(path: string, replace?: (routes: RouteObject[]) => RouteObject[]) {
  // Who was signed in during the test before is nobody's business in this one.
  signedOutGate.leave();
  const services = createServices();
  const routes = createRoutes(services.queryClient);
  const router = createMemoryRouter(replace ? replace(routes) : routes, { initialEntries: [path] });
  const user = setUpHands();
  const view = render(
    <Providers services={services}>
      <RouterProvider router={router} />
    </Providers>,
  );
  return { ...view, services, router, user };
}
