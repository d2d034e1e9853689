import { useEffect, useEffectEvent, useState } from 'react';

/** How long before the end the person is told. */
const noticeSeconds = 60;

export type IdleNotice = { readonly secondsLeft: number } | null;

type IdleOptions = {
  readonly timeoutSeconds: number;
  readonly isWatching: boolean;
  /** Somebody is at work: the server has to hear of it, which only sees calls. */
  readonly onStillHere: () => void;
  readonly onEnd: () => void;
};

/** Watches hands and scans. Tells before a sign-in ends for lack of them, keeps it going while there are some. */
export function useIdleEnd({ timeoutSeconds, isWatching, onStillHere, onEnd }: IdleOptions): IdleNotice {
  const [notice, setNotice] = useState<IdleNotice>(null);
  const stillHere = useEffectEvent(onStillHere);
  const end = useEffectEvent(onEnd);

  useEffect(() => {
    if (!isWatching) return;
    // The wall clock, since a tablet's timers stand still while it sleeps.
    let lastActAtMs = Date.now();
    let lastToldAtMs = lastActAtMs;
    let hasEnded = false;
    const tellEveryMs = (timeoutSeconds * 1000) / 4;

    const look = () => {
      const secondsLeft = Math.ceil(timeoutSeconds - (Date.now() - lastActAtMs) / 1000);
      if (secondsLeft <= 0 && !hasEnded) {
        hasEnded = true;
        setNotice(null);
        end();
      } else if (!hasEnded && secondsLeft <= Math.min(noticeSeconds, timeoutSeconds / 2)) setNotice({ secondsLeft });
    };
    const act = () => {
      // A tablet that slept past the end has not looked yet.
      look();
      if (hasEnded) return;
      lastActAtMs = Date.now();
      setNotice(null);
      if (lastActAtMs - lastToldAtMs < tellEveryMs) return;
      lastToldAtMs = lastActAtMs;
      stillHere();
    };

    const timer = window.setInterval(look, 1_000);
    window.addEventListener('pointerdown', act, true);
    window.addEventListener('keydown', act, true);
    return () => {
      window.clearInterval(timer);
      window.removeEventListener('pointerdown', act, true);
      window.removeEventListener('keydown', act, true);
      setNotice(null);
    };
  }, [isWatching, timeoutSeconds]);

  return notice;
}
