import { act, render, screen } from '@testing-library/react';
import { StrictMode } from 'react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { cameraRefusalInWords, codeFromCamera, createRepeatFilter } from '../../../src/lib/camera-codes';
import { CameraScanner } from '../../../src/lib/camera-scanner';
import type { Scan } from '../../../src/lib/scanner-input';

type Found = { getText: () => string; getBarcodeFormat: () => number };
type OnFrame = (found: Found | undefined) => void;

// The decoder itself is proved end to end, with a camera; here is what happens around it.
const camera = vi.hoisted(() => ({
  onFrame: [] as ((found: unknown) => void)[],
  stop: vi.fn(),
  start: vi.fn<() => Promise<void>>(() => Promise.resolve()),
}));

vi.mock('@zxing/browser', () => ({
  BrowserMultiFormatReader: class {
    async decodeFromConstraints(_constraints: unknown, _video: unknown, onFrame: OnFrame) {
      camera.onFrame.push(onFrame as (found: unknown) => void);
      await camera.start();
      return { stop: camera.stop };
    }
  },
}));

// Numbers of @zxing/library's BarcodeFormat: CODE_128 is 4, DATA_MATRIX is 5.
const code128 = 4;
const dataMatrix = 5;

function frame(text: string, format = code128): Found {
  return { getText: () => text, getBarcodeFormat: () => format };
}

function withCamera() {
  Object.defineProperty(navigator, 'mediaDevices', { value: {}, configurable: true });
}

beforeEach(() => {
  Reflect.deleteProperty(navigator, 'mediaDevices');
  camera.onFrame.length = 0;
  camera.stop.mockClear();
  camera.start.mockReset().mockResolvedValue(undefined);
});

describe('the camera', () => {
  it('reads on and on, the same code not twice in a row', async () => {
    withCamera();
    const scans: Scan[] = [];
    render(<CameraScanner onScan={(scan) => scans.push(scan)} />);
    expect(await screen.findByText('Hold the code inside the frame.')).toBeVisible();
    act(() => {
      const show = camera.onFrame.at(-1);
      for (const found of [undefined, frame('P1'), frame('P1'), frame('P2'), undefined]) show?.(found);
    });
    expect(scans.map(({ text, entry }) => [text, entry])).toEqual([
      ['P1', 'camera'],
      ['P2', 'camera'],
    ]);
  });

  it('spells a GS1 DataMatrix as scanners do', async () => {
    withCamera();
    const scans: Scan[] = [];
    render(<CameraScanner onScan={(scan) => scans.push(scan)} />);
    await screen.findByText('Hold the code inside the frame.');
    act(() => {
      camera.onFrame.at(-1)?.(frame('\u001d0109501101530003', dataMatrix));
    });
    expect(scans[0]?.text).toBe(']d20109501101530003');
  });

  it('starts once, also where effects run twice, and goes out when it leaves the screen', async () => {
    withCamera();
    const onScan = vi.fn();
    const { unmount } = render(
      <StrictMode>
        <CameraScanner onScan={onScan} />
      </StrictMode>,
    );
    await screen.findByText('Hold the code inside the frame.');
    expect(camera.onFrame).toHaveLength(1);
    expect(camera.stop).not.toHaveBeenCalled();
    unmount();
    expect(camera.stop).toHaveBeenCalledTimes(1);
    for (const show of camera.onFrame) show(frame('P1'));
    expect(onScan).not.toHaveBeenCalled();
  });

  it('that comes only after it was given up goes out again', async () => {
    withCamera();
    let come: () => void = () => undefined;
    camera.start.mockReturnValue(
      new Promise((resolve) => {
        come = resolve;
      }),
    );
    const { unmount } = render(<CameraScanner onScan={vi.fn()} />);
    await vi.waitFor(() => {
      expect(camera.onFrame).toHaveLength(1);
    });
    unmount();
    expect(camera.stop).not.toHaveBeenCalled();
    come();
    await vi.waitFor(() => {
      expect(camera.stop).toHaveBeenCalledTimes(1);
    });
  });

  it('says in words why there is no picture', async () => {
    withCamera();
    camera.start.mockRejectedValue(new DOMException('Permission denied', 'NotAllowedError'));
    render(<CameraScanner onScan={vi.fn()} />);
    expect(await screen.findByRole('alert')).toHaveTextContent(/Allow the camera for this address/);
  });

  it('says what an address without https cannot do, and does not try', () => {
    render(<CameraScanner onScan={vi.fn()} />);
    expect(screen.getByRole('alert')).toHaveTextContent(/only when Paperside is opened over https/);
    expect(camera.start).not.toHaveBeenCalled();
  });
});

describe('a code seen again', () => {
  it('counts again after two seconds without it, or after another', () => {
    const isNew = createRepeatFilter();
    const seen = (
      [
        ['P1', 0],
        ['P1', 1_900],
        ['P1', 3_800],
        ['P1', 5_801],
        ['P2', 5_900],
        ['P1', 6_000],
      ] as const
    ).map(([text, atMs]) => isNew(text, atMs));
    expect(seen).toEqual([true, false, false, true, true, true]);
  });
});

describe('what the decoder gives', () => {
  it('keeps the identifier of a GS1-128 and leaves other codes alone', () => {
    expect(codeFromCamera(']C10109501101530003', 'code-128')).toBe(']C10109501101530003');
    expect(codeFromCamera('P2043178442', 'code-128')).toBe('P2043178442');
    expect(codeFromCamera('P2043178442', 'data-matrix')).toBe('P2043178442');
    expect(codeFromCamera('\u001d0109501101530003', 'qr-code')).toBe(']Q30109501101530003');
  });
});

describe('a camera that does not start', () => {
  it.each(['NotAllowedError', 'NotFoundError', 'NotReadableError', 'SomethingElse'])(
    'for %s says what to do, and no name of an exception',
    (name) => {
      const words = cameraRefusalInWords(new DOMException('details', name));
      expect(words).toMatch(/\.$/);
      expect(words).not.toMatch(/Error|details|undefined/);
    },
  );
});
