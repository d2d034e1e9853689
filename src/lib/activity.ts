let lastActAtMs = Date.now();

/** Hears every touch and key in the window, scans included. Returns the way to stop. */
export function watchActivity(target: Window): () => void {
  const note = () => {
    lastActAtMs = Date.now();
  };
  target.addEventListener('pointerdown', note, true);
  target.addEventListener('keydown', note, true);
  return () => {
    target.removeEventListener('pointerdown', note, true);
    target.removeEventListener('keydown', note, true);
  };
}

/** Milliseconds since somebody touched or typed, by the wall clock: a tablet's timers stand still while it sleeps. */
export function msSinceAct(): number {
  return Date.now() - lastActAtMs;
}
