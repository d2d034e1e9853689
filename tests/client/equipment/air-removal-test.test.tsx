import { sterilizerSchema } from '#contract/equipment';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer, type Call } from '../../support/server-stub';

const sterilizerId = '0190f000-0000-7000-8000-000000000003';
const leadId = '0190f000-0000-7000-8000-000000000201';

const sterilizer = sterilizerSchema.parse({
  id: sterilizerId,
  version: 1,
  code: 'ST-3',
  number: '3',
  name: 'Sterilizer 3',
  sizeClass: 'large',
  chamberWidthMm: 620,
  chamberDepthMm: 1250,
  chamberHeightMm: 700,
  drainXMm: 280,
  drainYMm: 90,
  greatestLoadMassKg: 100,
  steamLine: 'B',
  hasAirDetector: true,
  needsAirRemovalTest: true,
  serviceState: 'in-service',
  qualifiedPrograms: [],
  otherPrograms: [],
  airRemoval: null,
});

const yesterday = {
  id: '0190f000-0000-7000-8000-000000000301',
  sterilizer: { id: sterilizerId, code: 'ST-3', name: 'Sterilizer 3' },
  testedAt: '2026-03-02T05:40:00.000Z',
  testDay: '2026-03-02',
  result: 'passed' as const,
  packLot: 'AR-2291',
  packExpiresOn: '2028-06-30',
  isBeforeFirstLoad: true,
  readBy: 'Lucasta Mburu',
  secondReader: null,
  note: '',
};

function stubTests(role: Parameters<typeof aSession>[0], more: Parameters<typeof stubServer>[0] = {}) {
  const self = aSession(role).person;
  return stubServer({
    'GET /api/session': () => ({ json: aSession(role) }),
    'GET /api/sterilizers': () => ({ json: { sterilizers: [sterilizer], total: 1, page: 1, pageSize: 100 } }),
    'GET /api/air-removal-tests': () => ({
      json: {
        tests: [yesterday],
        total: 1,
        page: 1,
        pageSize: 50,
        today: '2026-03-03',
        readers: [
          { id: self.id, name: self.displayName },
          { id: leadId, name: 'Lucasta Mburu' },
        ],
      },
    }),
    'POST /api/air-removal-tests': ({ body }: Call) => {
      const { result, isTakenOutOfService } = body as { result: 'passed' | 'failed'; isTakenOutOfService: boolean };
      return {
        status: 201,
        json: { test: { ...yesterday, result }, serviceState: isTakenOutOfService ? 'out-of-service' : 'in-service' },
      };
    },
    ...more,
  });
}

const address = `/stock/air-removal?sterilizer=${sterilizerId}`;

describe('the form of the air-removal test', () => {
  it('knows the sterilizer and the pack of the day before, and sends what was read', async () => {
    const server = stubTests('technician');
    const { user } = renderApp(address);
    expect(await screen.findByRole('combobox', { name: 'Sterilizer' })).toHaveValue(sterilizerId);
    expect(screen.getByRole('textbox', { name: 'Lot of the test pack' })).toHaveValue('AR-2291');
    await user.click(screen.getByRole('radio', { name: /Passed/ }));
    const when = screen.getByLabelText('When it ran');
    await user.clear(when);
    await user.type(when, '2026-03-03T05:40');
    await user.click(screen.getByRole('button', { name: 'Write it down' }));
    expect(await screen.findByText('ST-3: passed, written down.')).toBeInTheDocument();
    expect(server.callsTo('POST', '/api/air-removal-tests')[0]?.body).toMatchObject({
      sterilizerId,
      // Europe/London is at UTC on 3 March.
      testedAt: '2026-03-03T05:40:00.000Z',
      result: 'passed',
      packLot: 'AR-2291',
      packExpiresOn: '2028-06-30',
      isBeforeFirstLoad: true,
      secondReaderId: null,
      isTakenOutOfService: false,
    });
  });

  it('asks for the result, and sends nothing without it', async () => {
    const server = stubTests('technician');
    const { user } = renderApp(address);
    await user.click(await screen.findByRole('button', { name: 'Write it down' }));
    expect(await screen.findByText('Passed or failed.')).toBeInTheDocument();
    expect(server.callsTo('POST', '/api/air-removal-tests')).toHaveLength(0);
  });

  it('offers to take the sterilizer out of service only when the test failed', async () => {
    const server = stubTests('technician');
    const { user } = renderApp(address);
    await user.click(await screen.findByRole('radio', { name: /Passed/ }));
    expect(screen.queryByRole('checkbox', { name: /out of service/ })).toBeNull();
    await user.click(screen.getByRole('radio', { name: /Failed/ }));
    await user.click(screen.getByRole('checkbox', { name: /Take ST-3 out of service/ }));
    await user.click(screen.getByRole('button', { name: 'Write it down' }));
    expect(await screen.findByText(/It is out of service/)).toBeInTheDocument();
    expect(server.callsTo('POST', '/api/air-removal-tests')[0]?.body).toMatchObject({
      result: 'failed',
      isTakenOutOfService: true,
    });
  });

  it('does not take out of service what was set right to passed again', async () => {
    const server = stubTests('technician');
    const { user } = renderApp(address);
    await user.click(await screen.findByRole('radio', { name: /Failed/ }));
    await user.click(screen.getByRole('checkbox', { name: /Take ST-3 out of service/ }));
    await user.click(screen.getByRole('radio', { name: /Passed/ }));
    await user.click(screen.getByRole('button', { name: 'Write it down' }));
    await screen.findByText('ST-3: passed, written down.');
    expect(server.callsTo('POST', '/api/air-removal-tests')[0]?.body).toMatchObject({ isTakenOutOfService: false });
  });

  it('keeps what was filled in when another sterilizer is chosen', async () => {
    stubTests('technician');
    const { user } = renderApp('/stock/air-removal');
    await user.click(await screen.findByRole('radio', { name: /Failed/ }));
    await user.type(screen.getByRole('textbox', { name: /Remark/ }), 'Grey in the middle');
    await user.selectOptions(screen.getByRole('combobox', { name: 'Sterilizer' }), sterilizerId);
    await waitFor(() => {
      expect(screen.getByText('This sterilizer')).toBeInTheDocument();
    });
    expect(screen.getByRole('radio', { name: /Failed/ })).toBeChecked();
    expect(screen.getByRole('textbox', { name: /Remark/ })).toHaveValue('Grey in the middle');
  });

  it('names everybody but oneself as a second reader', async () => {
    stubTests('technician');
    renderApp(address);
    const readers = await screen.findByRole('combobox', { name: /Second reader/ });
    expect(
      within(readers)
        .getAllByRole('option')
        .map((option) => option.textContent),
    ).toEqual(['Nobody', 'Lucasta Mburu']);
  });

  it('says what the server refuses', async () => {
    stubTests('technician', {
      'POST /api/air-removal-tests': () => ({
        problem: 'air-removal-test.pack-expired',
        status: 422,
        detail: 'The test pack had expired on the day of the test.',
      }),
    });
    const { user } = renderApp(address);
    await user.click(await screen.findByRole('radio', { name: /Passed/ }));
    await user.click(screen.getByRole('button', { name: 'Write it down' }));
    expect(await screen.findByText('The test pack had expired on the day of the test.')).toBeInTheDocument();
  });

  it('is not there for who only looks, but the latest tests are', async () => {
    stubTests('surveyor');
    renderApp(address);
    expect(await screen.findByText(/Lucasta Mburu/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: 'Write it down' })).toBeNull();
  });
});
