import { paths } from '#contract/paths';
import { useEffect } from 'react';
import { z } from 'zod';
import { Banner } from '../components/ui/states';
import { Time } from '../components/ui/time';
import { api } from '../lib/api-client';
import { useLine } from '../lib/line';

const askAgainMs = 4_000;

/** Shown while the server does not answer; asks again by itself until it does. */
export function OfflineBand() {
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
  if (line.isUp) return null;
  return (
    <Banner
      title={
        <>
          No line to the server since <Time at={line.since} />
        </>
      }
    >
      What is on screen may be older than that. Whatever asks the server waits for the line; it is tried again by
      itself.
    </Banner>
  );
}
