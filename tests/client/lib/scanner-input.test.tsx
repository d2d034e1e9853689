import { screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Dialog } from '../../../src/components/ui/dialog';
import { Button } from '../../../src/components/ui/button';
import { SelectField } from '../../../src/components/ui/select-field';
import { TextField } from '../../../src/components/ui/text-field';
import { useScanner, useScanWatcher, type Scan, type ScanLayer } from '../../../src/lib/scanner-input';
import { renderPart } from '../../support/render-app';
import { wedge } from '../../support/scanner';

type Heard = (text: string) => void;

function Listener({ heard, layer = 'screen', isOn = true }: { heard: Heard; layer?: ScanLayer; isOn?: boolean }) {
  useScanner(
    (scan: Scan) => {
      heard(scan.text);
    },
    { layer, isOn },
  );
  return null;
}

describe('a scan', () => {
  it('reaches the screen from anywhere on it', () => {
    const heard = vi.fn<Heard>();
    renderPart(<Listener heard={heard} />);
    wedge('P-20431784-42');
    expect(heard.mock.calls).toEqual([['P-20431784-42']]);
  });

  it('is told with how it came in', () => {
    const scans: Scan[] = [];
    function Keeper() {
      useScanner((scan) => {
        scans.push(scan);
      });
      return null;
    }
    const { services } = renderPart(<Keeper />);
    wedge('P20431');
    services.scanner.deliver({ text: 'P20432', entry: 'camera', atMs: 1 });
    expect(scans.map(({ text, entry }) => [text, entry])).toEqual([
      ['P20431', 'wedge'],
      ['P20432', 'camera'],
    ]);
  });

  it('follows another at once and both arrive', () => {
    const heard = vi.fn<Heard>();
    renderPart(<Listener heard={heard} />);
    wedge('P20431', { gapMs: 0 });
    wedge('P20432', { gapMs: 0 });
    expect(heard.mock.calls).toEqual([['P20431'], ['P20432']]);
  });

  it('never presses the button that has the focus', () => {
    const pressed = vi.fn();
    const heard = vi.fn<Heard>();
    renderPart(
      <>
        <Listener heard={heard} />
        <Button onPress={pressed}>Close load</Button>
      </>,
    );
    screen.getByRole('button', { name: 'Close load' }).focus();
    const through = wedge('HOLDER 2');
    expect(heard).toHaveBeenCalledWith('HOLDER 2');
    expect(pressed).not.toHaveBeenCalled();
    // One letter alone could have been typed; nothing after it gets through.
    expect(through).toEqual(['H']);
  });

  it('too short to be a label presses nothing either', () => {
    const pressed = vi.fn();
    const heard = vi.fn<Heard>();
    renderPart(
      <>
        <Listener heard={heard} />
        <Button onPress={pressed}>Close load</Button>
      </>,
    );
    screen.getByRole('button', { name: 'Close load' }).focus();
    wedge('7');
    expect(heard).not.toHaveBeenCalled();
    expect(pressed).not.toHaveBeenCalled();
  });

  it('does not pick another entry of a list that has the focus', () => {
    const heard = vi.fn<Heard>();
    renderPart(
      <>
        <Listener heard={heard} />
        <SelectField label="Sterilizer" options={[{ value: '1', label: 'Sterilizer 1' }]} />
      </>,
    );
    screen.getByRole('combobox', { name: 'Sterilizer' }).focus();
    expect(wedge('P20431')).toEqual([]);
    expect(heard).toHaveBeenCalledWith('P20431');
  });

  it('is left to a text field that has the focus', () => {
    const heard = vi.fn<Heard>();
    renderPart(
      <>
        <Listener heard={heard} />
        <TextField label="Serial number" />
      </>,
    );
    const field = screen.getByRole('textbox', { name: 'Serial number' });
    field.focus();
    wedge('SN-4471');
    expect(heard).not.toHaveBeenCalled();
    expect(field).toHaveValue('SN-4471');
  });

  it('goes past a field that is lent to the scanner, which keeps what was in it', () => {
    const heard = vi.fn<Heard>();
    const sent = vi.fn();
    function Search() {
      const [text, setText] = useState('tray');
      return (
        <form onSubmit={sent}>
          <TextField
            label="Find"
            data-scan="yes"
            value={text}
            onChange={(event) => {
              setText(event.target.value);
            }}
          />
        </form>
      );
    }
    renderPart(
      <>
        <Listener heard={heard} />
        <Search />
      </>,
    );
    const field = screen.getByRole('textbox', { name: 'Find' });
    field.focus();
    wedge('P20431');
    expect(heard).toHaveBeenCalledWith('P20431');
    expect(field).toHaveValue('tray');
    expect(sent).not.toHaveBeenCalled();
  });

  it('typed by hand into a lent field stays there', () => {
    const heard = vi.fn<Heard>();
    renderPart(
      <>
        <Listener heard={heard} />
        <TextField label="Find" data-scan="yes" />
      </>,
    );
    const field = screen.getByRole('textbox', { name: 'Find' });
    field.focus();
    wedge('retractor', { gapMs: 120, suffix: null });
    expect(field).toHaveValue('retractor');
    expect(heard).not.toHaveBeenCalled();
  });

  it('carries its control characters', () => {
    const heard = vi.fn<Heard>();
    renderPart(<Listener heard={heard} />);
    wedge('0109501101530003\u001d10ABC');
    expect(heard).toHaveBeenCalledWith('0109501101530003\u001d10ABC');
  });
});

describe('who gets a scan', () => {
  it('is the sheet that lies over the screen, also while a dialog holds the focus', async () => {
    const below = vi.fn<Heard>();
    const over = vi.fn<Heard>();
    renderPart(
      <>
        <Dialog isOpen title="Change person">
          <Listener heard={over} layer="sheet" />
          <Button>Sign in</Button>
        </Dialog>
        <Listener heard={below} />
      </>,
    );
    (await screen.findByRole('button', { name: 'Sign in' })).focus();
    wedge('N48120937');
    expect(over).toHaveBeenCalledWith('N48120937');
    expect(below).not.toHaveBeenCalled();
  });

  it('is the screen again when the sheet has gone, and nobody when none is on', () => {
    const below = vi.fn<Heard>();
    const over = vi.fn<Heard>();
    function Two() {
      const [isOver, setIsOver] = useState(true);
      return (
        <>
          <Listener heard={below} />
          <Listener heard={over} layer="sheet" isOn={isOver} />
          <Button
            onPress={() => {
              setIsOver(false);
            }}
          >
            Away
          </Button>
        </>
      );
    }
    const { user, unmount } = renderPart(<Two />);
    return user.click(screen.getByRole('button', { name: 'Away' })).then(() => {
      wedge('P20431');
      expect(below).toHaveBeenCalledTimes(1);
      expect(over).not.toHaveBeenCalled();
      unmount();
      wedge('P20432');
      expect(below).toHaveBeenCalledTimes(1);
    });
  });

  it('is nobody else when a watcher takes it away', () => {
    const heard = vi.fn<Heard>();
    function Watcher() {
      useScanWatcher((scan) => scan.text.startsWith('N'));
      return null;
    }
    renderPart(
      <>
        <Watcher />
        <Listener heard={heard} />
      </>,
    );
    wedge('N48120937');
    wedge('P20431');
    expect(heard.mock.calls).toEqual([['P20431']]);
  });
});
