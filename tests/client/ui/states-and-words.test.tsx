import { act, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { useAnnounce } from '../../../src/components/ui/announcer';
import { Button } from '../../../src/components/ui/button';
import { Pin } from '../../../src/components/ui/pin';
import { ScanAnswer } from '../../../src/components/ui/scan-answer';
import { Banner, EmptyState, WaitingState, WrongState } from '../../../src/components/ui/states';
import { TabLinks, Tabs } from '../../../src/components/ui/tabs';
import { Clock, DateText, Day, Moment, Time } from '../../../src/components/ui/time';
import { NoLineError } from '../../../src/lib/errors';
import { FacilityContext, unknownFacility } from '../../../src/lib/facility';
import { renderPart } from '../../support/render-app';

describe('what is said to screen readers', () => {
  it('is said again when the same words come again, cutting in where asked', async () => {
    function Speaker() {
      const announce = useAnnounce();
      return (
        <>
          <Button
            onPress={() => {
              announce('Not taken.', 'assertive');
            }}
          >
            Cut in
          </Button>
          <Button
            onPress={() => {
              announce('Taken.');
            }}
          >
            Say
          </Button>
        </>
      );
    }
    const { user } = renderPart(<Speaker />);
    const said = (urgency: string) =>
      [...document.querySelectorAll(`[data-live-announcer] [aria-live="${urgency}"] span`)].map(
        (element) => element.textContent,
      );
    await user.click(screen.getByRole('button', { name: 'Cut in' }));
    const once = said('assertive');
    await user.click(screen.getByRole('button', { name: 'Cut in' }));
    const twice = said('assertive');
    expect(once.toSorted()).toEqual(['', 'Not taken.']);
    // The other of two places now holds the words: for a reader that is a change.
    expect(twice).toEqual(once.toReversed());
    await user.click(screen.getByRole('button', { name: 'Say' }));
    expect(said('polite')).toContain('Taken.');
  });

  it('goes with each pin: its level, where only the outline shows it', () => {
    renderPart(
      <p>
        <Pin letter="A" level="hold" />
        <Pin letter="B" level="look" isLevelSaid />
      </p>,
    );
    expect(screen.getByText(/^A/)).toHaveTextContent('A, Holds the load');
    expect(screen.getByText(/^B/)).toHaveTextContent(/^B$/);
  });

  it('holds the answer to a scan in words', () => {
    renderPart(
      <ScanAnswer look="called-back" word="Not taken" title="Bone curette, size 1">
        Called back. Put it on the hold shelf.
      </ScanAnswer>,
    );
    expect(screen.getByText('Not taken')).toBeVisible();
    expect(screen.getByText('Called back. Put it on the hold shelf.')).toBeVisible();
  });
});

describe('panels for what is not there', () => {
  it('say after four seconds what they wait for, and not before', () => {
    vi.useFakeTimers();
    renderPart(<WaitingState title="Fetching the load" waitsFor="The server has not answered yet." />);
    act(() => {
      vi.advanceTimersByTime(3_900);
    });
    expect(screen.getByRole('status')).toBeEmptyDOMElement();
    act(() => {
      vi.advanceTimersByTime(200);
    });
    expect(screen.getByRole('status')).toHaveTextContent('The server has not answered yet.');
  });

  it('offer ways on when something went wrong', async () => {
    const tryAgain = vi.fn();
    const { user } = renderPart(
      <WrongState title="The list did not come" error={new NoLineError('x')} onTryAgain={tryAgain} />,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('The server did not answer.');
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(tryAgain).toHaveBeenCalledTimes(1);
  });

  it('offer one act when there is nothing yet', () => {
    renderPart(
      <>
        <EmptyState title="No cart open here" act={<Button>Open a load</Button>}>
          Scan a cart to begin.
        </EmptyState>
        <Banner title="No line to the server since 09:38" foot="Kept: 12 scans">
          Keep scanning.
        </Banner>
      </>,
    );
    expect(screen.getByRole('heading', { name: 'No cart open here' })).toBeVisible();
    expect(screen.getByRole('button', { name: 'Open a load' })).toBeVisible();
    expect(screen.getByRole('status')).toHaveTextContent(/12 scans/);
  });
});

describe('times on the screen', () => {
  it('are those of the facility, each with its instant', () => {
    renderPart(
      <FacilityContext value={{ ...unknownFacility, timeZone: 'America/New_York' }}>
        <Time at="2026-03-17T14:41:08Z" withSeconds />
        <DateText at="2026-03-17T03:30:00Z" form="weekday" />
        <Day day="2026-03-17" />
      </FacilityContext>,
    );
    expect(screen.getByText('10:41:08')).toHaveAttribute('datetime', '2026-03-17T14:41:08Z');
    expect(screen.getByText('Monday 16 March')).toBeVisible();
    expect(screen.getByText('17 March 2026')).toBeVisible();
  });

  it('go on by themselves at the full minute', () => {
    vi.useFakeTimers({ now: new Date('2026-03-17T09:40:59.500Z') });
    renderPart(
      <FacilityContext value={{ ...unknownFacility, timeZone: 'Europe/London' }}>
        <Clock />
        <Moment at="2026-03-16T21:10:00Z" />
      </FacilityContext>,
    );
    expect(screen.getByText('09:40')).toBeVisible();
    act(() => {
      vi.advanceTimersByTime(600);
    });
    expect(screen.getByText('09:41')).toBeVisible();
    expect(screen.getByText('16 March, 21:10')).toBeVisible();
  });
});

describe('tabs', () => {
  it('change the panel with the arrow keys', async () => {
    const { user } = renderPart(
      <Tabs
        label="Shelf or findings"
        tabs={[
          { id: 'shelf', label: 'Shelf 2', panel: '26 listed' },
          { id: 'findings', label: 'Findings', panel: 'Letters match the pins' },
        ]}
      />,
    );
    await user.tab();
    expect(screen.getByRole('tab', { name: 'Shelf 2', selected: true })).toHaveFocus();
    await user.keyboard('{ArrowRight}');
    expect(screen.getByRole('tabpanel', { name: 'Findings' })).toHaveTextContent('Letters match the pins');
  });

  it('that are pages say which one is open', () => {
    renderPart(
      <TabLinks
        label="Stock"
        links={[
          { to: '/stock/items', label: 'Items', count: 52 },
          { to: '/stock/carts', label: 'Carts' },
        ]}
      />,
      '/stock/items',
    );
    expect(screen.getByRole('link', { name: /Items/ })).toHaveAttribute('aria-current', 'page');
    expect(screen.getByRole('link', { name: 'Carts' })).not.toHaveAttribute('aria-current');
  });
});
