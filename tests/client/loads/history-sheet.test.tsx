import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { HistorySheet } from '../../../src/features/loads/components/history-sheet';
import { FacilityContext, unknownFacility } from '../../../src/lib/facility';
import { renderPart } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

const loadId = '0190f000-0000-7000-8000-000000000701';

function openSheet() {
  return renderPart(
    <FacilityContext value={{ ...unknownFacility, timeZone: 'Europe/London' }}>
      <HistorySheet loadId={loadId} number="1-26062-03" onClose={() => undefined} />
    </FacilityContext>,
  );
}

describe('what happened to a load', () => {
  it('is told with who and when, the latest first', async () => {
    stubServer({
      [`GET /api/loads/${loadId}/history`]: () => ({
        json: {
          events: [
            {
              id: '2',
              at: '2026-03-03T09:05:00.000Z',
              who: 'Ines Marchetti',
              kind: 'load.package-moved',
              sentence: 'P-20431784-52: Turned Mayo scissors curved so that paper is right',
            },
            {
              id: '1',
              at: '2026-03-03T09:00:00.000Z',
              who: 'Dele Oyelaran',
              kind: 'load.opened',
              sentence: 'Opened, 3 packages listed',
            },
          ],
        },
      }),
    });
    openSheet();
    const sheet = within(await screen.findByRole('dialog', { name: 'What happened to load 1-26062-03' }));
    const lines = within(await sheet.findByRole('list', { name: 'What happened' })).getAllByRole('listitem');
    expect(lines.map((line) => line.textContent)).toEqual([
      'P-20431784-52: Turned Mayo scissors curved so that paper is rightInes Marchetti, Tue 3 Mar, 09:05',
      'Opened, 3 packages listedDele Oyelaran, Tue 3 Mar, 09:00',
    ]);
  });

  it('says when it did not come, and tries again', async () => {
    const path = `GET /api/loads/${loadId}/history`;
    const server = stubServer({
      [path]: () => ({ problem: 'server.failed', status: 500, detail: 'Try again later.' }),
    });
    const { user } = openSheet();
    expect(await screen.findByText('What happened did not come')).toBeVisible();
    server.handlers[path] = () => ({ json: { events: [] } });
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Nothing yet')).toBeVisible();
  });
});
