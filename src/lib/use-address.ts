import { useEffect, useRef, useState } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';

type Changes = Readonly<Record<string, string | null>>;

/**
 * What a screen keeps in its address. The router takes its time, and of two changes right after each other it would keep
 * the second only: so each change is laid over what was asked for last, and shown at once. A link or "back" wins over it.
 */
export function useAddress(): {
  readonly params: URLSearchParams;
  /** null and '' take a name away. A new step is one that "back" comes back from. */
  readonly write: (changes: Changes, isNewStep?: boolean) => void;
} {
  const [params, setParams] = useSearchParams();
  const { key } = useLocation();
  const [arrived, setArrived] = useState(key);
  const [asked, setAsked] = useState<readonly string[]>([]);
  if (arrived !== key) {
    setArrived(key);
    const at = asked.lastIndexOf(params.toString());
    setAsked(at === -1 ? [] : asked.slice(at + 1));
  }
  const shown = asked.at(-1) ?? params.toString();
  const last = useRef(shown);
  useEffect(() => {
    last.current = shown;
  }, [shown]);

  return {
    params: new URLSearchParams(shown),
    write: (changes, isNewStep = false) => {
      const next = new URLSearchParams(last.current);
      for (const [name, value] of Object.entries(changes)) {
        if (value === null || value === '') next.delete(name);
        else next.set(name, value);
      }
      last.current = next.toString();
      setAsked((before) => [...before, next.toString()]);
      setParams(next, { replace: !isNewStep });
    },
  };
}
