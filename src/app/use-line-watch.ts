import { paths } from '#contract/paths';
import { useEffect } from 'react';
import { z } from 'zod';
import { api } from '../lib/api-client';
import { useLine, type Line } from '../lib/line';

const askAgainMs = 4_000;

/** The line to the server; while it is down it is asked for until it is up. */
export function useLineWatch(): Line {
  const line = useLine();
  useEffect(() => {
    if (line.isUp) return;
    const timer = window.setInterval(() => {
      // The call itself notes that the line is up again.
      api.get(paths.health, z.unknown(), { patienceMs: 3_000, whenSignedOut: 'throw' }).catch(() => undefined);
    }, askAgainMs);
    return () => {
      window.clearInterval(timer);
    };
  }, [line]);
  return line;
}
