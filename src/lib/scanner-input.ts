import { createContext, use, useEffect, useEffectEvent } from 'react';
import { createScanReader, type ScanVerdict } from './scan-reader';

/** How the code came in; the server keeps it with the scan. */
export type ScanEntry = 'wedge' | 'camera' | 'keyed';

export type Scan = {
  /** As the symbol says, with GS (0x1D) between fields. May hold anything. */
  readonly text: string;
  readonly entry: ScanEntry;
  /** `performance.now()` of the last key or frame, for measuring. */
  readonly atMs: number;
};

export type ScanHandler = (scan: Scan) => void;

/** Sheets lie over screens, so their handlers are asked first; within a layer the youngest is. */
export type ScanLayer = 'screen' | 'sheet';

export type ScannerHub = ReturnType<typeof createScannerHub>;

/** Text fields keep what is typed into them; this attribute lends one to the scanner. */
const lentToScanner = '[data-scan="yes"]';

type TextField = HTMLInputElement | HTMLTextAreaElement;

const inputsWithoutText = ['button', 'checkbox', 'color', 'file', 'image', 'radio', 'range', 'reset', 'submit'];

function textFieldOf(target: EventTarget | null): TextField | null {
  if (target instanceof HTMLTextAreaElement) return target;
  if (target instanceof HTMLInputElement && !inputsWithoutText.includes(target.type)) return target;
  return null;
}

/** Gives a field back the text it had, in the way React notices. */
function restore(field: TextField, text: string) {
  const prototype = field instanceof HTMLTextAreaElement ? HTMLTextAreaElement.prototype : HTMLInputElement.prototype;
  Object.getOwnPropertyDescriptor(prototype, 'value')?.set?.call(field, text);
  field.dispatchEvent(new Event('input', { bubbles: true }));
}

/** A button or a list that has the focus must see nothing of a scan. */
function isForScannerOnly(verdict: ScanVerdict, target: EventTarget | null): boolean {
  // One character alone may be typed by hand; only a list would pick another entry by it.
  return verdict.kind !== 'first' || target instanceof HTMLSelectElement;
}

/** In a field lent to the scanner everything lands as typed, since it may be; the text is put back once it was a scan. */
function isForScannerInField(verdict: ScanVerdict, event: KeyboardEvent): boolean {
  return verdict.kind === 'scan' || verdict.kind === 'tail' || (verdict.kind === 'inside' && event.ctrlKey);
}

/**
 * Where scans arrive, from the keyboard wedge and from the camera, and who gets them: exactly one handler, the
 * top-most. Watchers see a scan first and may take it away (a badge changes the person on every screen).
 */
export function createScannerHub() {
  const handlers: { handle: ScanHandler; layer: ScanLayer }[] = [];
  const watchers = new Set<(scan: Scan) => boolean>();
  const reader = createScanReader();
  /** Keys whose press was swallowed: their release must reach nothing either. */
  const swallowedKeys = new Set<string>();
  let fieldBefore: { field: TextField; text: string } | null = null;

  function deliver(scan: Scan) {
    for (const watch of [...watchers]) if (watch(scan)) return;
    const top = handlers.findLast(({ layer }) => layer === 'sheet') ?? handlers.at(-1);
    top?.handle(scan);
  }

  function swallow(event: KeyboardEvent) {
    event.preventDefault();
    event.stopImmediatePropagation();
  }

  function onKeyDown(event: KeyboardEvent) {
    if (event.isComposing || event.altKey || event.metaKey) return;
    const field = textFieldOf(event.target);
    if (field !== null && !field.matches(lentToScanner)) {
      reader.forget();
      return;
    }
    const verdict = reader.read({
      key: event.key,
      isCtrl: event.ctrlKey,
      isRepeat: event.repeat,
      atMs: event.timeStamp,
    });
    if (verdict.kind === 'typed') return;
    if (verdict.kind === 'first' && field !== null) fieldBefore = { field, text: field.value };
    if (field === null ? isForScannerOnly(verdict, event.target) : isForScannerInField(verdict, event)) {
      swallow(event);
      swallowedKeys.add(event.key);
    }
    if (verdict.kind !== 'scan') return;
    if (field !== null && fieldBefore?.field === field) restore(field, fieldBefore.text);
    fieldBefore = null;
    deliver({ text: verdict.text, entry: 'wedge', atMs: event.timeStamp });
  }

  function onKeyUp(event: KeyboardEvent) {
    if (swallowedKeys.delete(event.key)) swallow(event);
  }

  return {
    /** Starts listening; returns the way to stop. Capturing, so that no button or dialog sees a key of a scan. */
    attach(target: Window): () => void {
      target.addEventListener('keydown', onKeyDown, true);
      target.addEventListener('keyup', onKeyUp, true);
      return () => {
        target.removeEventListener('keydown', onKeyDown, true);
        target.removeEventListener('keyup', onKeyUp, true);
        reader.forget();
      };
    },

    /** A scan that came in another way: the camera, or a code keyed in by hand. */
    deliver,

    push(handle: ScanHandler, layer: ScanLayer): () => void {
      const entry = { handle, layer };
      handlers.push(entry);
      return () => {
        handlers.splice(handlers.indexOf(entry), 1);
      };
    },

    /** Sees every scan before the handlers do; true means it was meant for the watcher and goes no further. */
    watch(watcher: (scan: Scan) => boolean): () => void {
      watchers.add(watcher);
      return () => {
        watchers.delete(watcher);
      };
    },
  };
}

export const ScannerContext = createContext<ScannerHub | null>(null);

export function useScannerHub(): ScannerHub {
  const hub = use(ScannerContext);
  if (hub === null) throw new Error('useScanner needs a ScannerContext above it');
  return hub;
}

/** Scans go to this handler while the component is on screen, unless something lies over it. */
export function useScanner(
  handler: ScanHandler,
  { layer = 'screen', isOn = true }: { layer?: ScanLayer; isOn?: boolean } = {},
): void {
  const hub = useScannerHub();
  const handle = useEffectEvent(handler);
  useEffect(() => {
    if (!isOn) return;
    return hub.push((scan) => {
      handle(scan);
    }, layer);
  }, [hub, layer, isOn]);
}

/** Sees every scan first; return true to keep it from the screen. */
export function useScanWatcher(watcher: (scan: Scan) => boolean): void {
  const hub = useScannerHub();
  const watch = useEffectEvent(watcher);
  useEffect(() => hub.watch((scan) => watch(scan)), [hub]);
}
