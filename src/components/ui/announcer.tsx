import { createContext, use, useCallback, useMemo, useRef, useState, type ReactNode } from 'react';
import { createPortal } from 'react-dom';

/** polite waits for the reader to finish; assertive cuts in, for what was not taken. */
export type Urgency = 'polite' | 'assertive';

type Announce = (words: string, urgency?: Urgency) => void;

const AnnounceContext = createContext<Announce | null>(null);

type Spoken = { readonly words: string; readonly turn: number };

const silence: Spoken = { words: '', turn: 0 };

/** Two places take turns, so that the same words said twice are read twice. */
function Region({ urgency, spoken }: { urgency: Urgency; spoken: Spoken }) {
  return (
    <div aria-live={urgency} aria-atomic="true">
      <span>{spoken.turn % 2 === 0 ? spoken.words : ''}</span>
      <span>{spoken.turn % 2 === 1 ? spoken.words : ''}</span>
    </div>
  );
}

/** Holds the live regions, outside of everything that a dialog hides from screen readers. */
export function AnnouncerProvider({ children }: { children: ReactNode }) {
  const [polite, setPolite] = useState(silence);
  const [assertive, setAssertive] = useState(silence);
  const turn = useRef(0);
  const announce = useCallback<Announce>((words, urgency = 'polite') => {
    turn.current += 1;
    const spoken = { words, turn: turn.current };
    if (urgency === 'assertive') setAssertive(spoken);
    else setPolite(spoken);
  }, []);
  const regions = useMemo(
    () => (
      // The attribute by which the dialog's own hiding spares announcers.
      <div data-live-announcer="true" className="sr-only">
        <Region urgency="polite" spoken={polite} />
        <Region urgency="assertive" spoken={assertive} />
      </div>
    ),
    [polite, assertive],
  );
  return (
    <AnnounceContext value={announce}>
      {children}
      {createPortal(regions, document.body)}
    </AnnounceContext>
  );
}

/** Says something to screen readers: `announce('Taken. Holder 2, slot 5.')`. */
export function useAnnounce(): Announce {
  const announce = use(AnnounceContext);
  if (announce === null) throw new Error('useAnnounce needs an AnnouncerProvider above it');
  return announce;
}
