import { processName, processParent } from './processes';

export type StopRequest = {
  readonly isMade: () => boolean;
  /** Resolves when somebody wants this program to end. */
  readonly made: Promise<void>;
};

const pollMs = 250;

/**
 * Notices every way in which a person or a supervisor ends this program, once: Ctrl-C, a signal, a closed terminal, a
 * reader of its output that went away, and npm's end. The caller then has the time to close things in order.
 */
export function listenForStop(): StopRequest {
  let isMade = false;
  let resolveMade: () => void = () => undefined;
  const made = new Promise<void>((resolve) => (resolveMade = resolve));
  function make(): void {
    isMade = true;
    resolveMade();
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, make);
  for (const stream of [process.stdout, process.stderr]) stream.on('error', make);
  if (process.env.npm_lifecycle_event !== undefined) watchLauncher(make);
  return { isMade: () => isMade, made };
}

/** npm ended by a signal does not always pass it on; what it leaves behind is a child with another parent. */
function watchLauncher(onEnd: () => void): void {
  const links = listLinksToLauncher(process.pid);
  const timer = setInterval(() => {
    if (links.every(({ child, parent }) => processParent(child) === parent)) return;
    clearInterval(timer);
    onEnd();
  }, pollMs);
  timer.unref();
}

type Link = { readonly child: number; readonly parent: number };

/** npm starts a script through a shell, which may or may not have made way for it. */
function listLinksToLauncher(child: number): Link[] {
  const parent = processParent(child);
  if (parent === undefined || parent <= 1) return [];
  const isShell = /^(ba|da)?sh$/.test(processName(parent) ?? '');
  return [{ child, parent }, ...(isShell ? listLinksToLauncher(parent) : [])];
}
