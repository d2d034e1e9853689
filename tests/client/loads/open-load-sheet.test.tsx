import type { loadOpeningOptionsSchema } from '#contract/loads';
import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { z } from 'zod';
import { aSession, renderApp } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

type Options = z.input<typeof loadOpeningOptionsSchema>;
type SterilizerOption = Options['sterilizers'][number];

function anId(number: number): string {
  return `0190f000-0000-7000-8000-${String(number).padStart(12, '0')}`;
}

const program = {
  id: anId(602),
  code: 'W4-20',
  name: 'Wrapped, dry 20 min',
  type: 'dynamic-air-removal',
  temperatureC: 132,
  exposureS: 240,
  dryS: 1200,
  greatestLoadMassKg: null,
} as const;

function anOption(
  number: number,
  serviceState: SterilizerOption['sterilizer']['serviceState'] = 'in-service',
): SterilizerOption {
  return {
    sterilizer: {
      id: anId(610 + number),
      code: `ST-${number}`,
      number: String(number),
      name: `Sterilizer ${number}`,
      chamberWidthMm: 620,
      chamberDepthMm: 1250,
      chamberHeightMm: 700,
      drainXMm: 280,
      drainYMm: 100,
      greatestLoadMassKg: 100,
      needsAirRemovalTest: true,
      serviceState,
    },
    programs: [program],
    unqualified: [],
    carts: [
      {
        id: anId(620 + number),
        code: `C${number}`,
        name: `Cart ${number}`,
        shelves: [],
        isFree: true,
        usedBy: null,
      },
    ],
    airRemoval: null,
  };
}

const run = {
  id: anId(501),
  name: 'Mixed sets',
  packages: 2,
  implants: 0,
  sterilizerId: anId(612),
  programId: program.id,
  wantedAt: null,
};

async function openSheet(options: Options) {
  const server = stubServer({
    'GET /api/session': () => ({ json: aSession('technician') }),
    'GET /api/loads': () => ({ json: { loads: [], hasOlder: false } }),
    'GET /api/loads/opening-options': () => ({ json: options }),
  });
  const view = renderApp('/loads');
  const [open] = await screen.findAllByRole('button', { name: 'Open a load' });
  if (!open) throw new Error('there is no way to open a load');
  await view.user.click(open);
  await screen.findByLabelText(/^Sterilizer/);
  return { server, ...view };
}

describe('opening a load', () => {
  it('shows a sterilizer that is not in service with its reason, and not to be chosen', async () => {
    await openSheet({
      sterilizers: [anOption(1), anOption(2, 'out-of-service'), anOption(3, 'awaiting-requalification')],
      runs: [],
    });
    expect(screen.getByRole('option', { name: 'Sterilizer 1' })).toBeEnabled();
    expect(screen.getByRole('option', { name: 'Sterilizer 2, out of service' })).toBeDisabled();
    expect(screen.getByRole('option', { name: 'Sterilizer 3, awaiting requalification' })).toBeDisabled();
  });

  it('takes the sterilizer, program and a cart from the run', async () => {
    const { user } = await openSheet({ sterilizers: [anOption(1), anOption(2)], runs: [run] });
    await user.selectOptions(screen.getByLabelText('Packages'), run.id);
    await waitFor(() => {
      expect(screen.getByLabelText('Sterilizer')).toHaveValue(anId(612));
    });
    expect(screen.getByLabelText('Program')).toHaveValue(program.id);
    expect(screen.getByLabelText('Cart')).toHaveValue(anId(622));
  });

  it('does not choose what a run is meant for while that is out of service, says so, and keeps the program', async () => {
    const { user } = await openSheet({ sterilizers: [anOption(1), anOption(2, 'out-of-service')], runs: [run] });
    await user.selectOptions(screen.getByLabelText('Packages'), run.id);
    expect(
      await screen.findByText(
        'This run is meant for Sterilizer 2, which is out of service. Choose another sterilizer.',
      ),
    ).toBeVisible();
    expect(screen.getByLabelText('Sterilizer')).toHaveValue('');
    await user.selectOptions(screen.getByLabelText('Sterilizer'), anId(611));
    await waitFor(() => {
      expect(screen.getByLabelText('Program')).toHaveValue(program.id);
    });
  });
});
