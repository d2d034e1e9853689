import { fireEvent } from '@testing-library/react';
import { greatestStutterMs } from '../../src/lib/scan-reader';

/** Milliseconds on the clock of the keys; each scan begins well after the last one, and after what was typed. */
let clockMs = 0;

type KeyOptions = { readonly gapMs?: number; readonly suffix?: 'Enter' | 'Tab' | null; readonly target?: Element };

function press(target: Element, key: string, isCtrl: boolean, atMs: number): boolean {
  const init = { key, ctrlKey: isCtrl, bubbles: true, cancelable: true };
  const down = new KeyboardEvent('keydown', init);
  Object.defineProperty(down, 'timeStamp', { value: atMs });
  const isFree = fireEvent(target, down);
  fireEvent(target, new KeyboardEvent('keyup', init));
  return isFree;
}

/** Types as a keyboard wedge does, at the element that has the focus; GS (0x1D) as Ctrl and ]. Says which keys got through. */
export function wedge(text: string, { gapMs = 8, suffix = 'Enter', target }: KeyOptions = {}): string[] {
  const at = target ?? document.activeElement ?? document.body;
  const through: string[] = [];
  clockMs = Math.max(clockMs, new Event('now').timeStamp) + 1_000;
  const keys = Array.from(text, (character) =>
    character === '\u001d' ? { key: ']', isCtrl: true } : { key: character, isCtrl: false },
  );
  if (suffix !== null) keys.push({ key: suffix, isCtrl: false });
  for (const { key, isCtrl } of keys) {
    clockMs += gapMs;
    if (press(at, key, isCtrl, clockMs)) {
      through.push(key);
      writeInto(at, key, isCtrl);
    }
  }
  return through;
}

/** What a browser does with a key that nobody kept from a text field. */
function writeInto(target: Element, key: string, isCtrl: boolean) {
  if (isCtrl || key.length !== 1 || !(target instanceof HTMLInputElement)) return;
  fireEvent.input(target, { target: { value: target.value + key } });
}

/** Hands rest before Enter; what comes sooner after keys as quick as a test's was typed by a scanner. */
export function pause(): Promise<void> {
  return new Promise((resolve) => {
    setTimeout(resolve, greatestStutterMs + 50);
  });
}
