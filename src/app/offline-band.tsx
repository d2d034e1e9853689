import { Banner } from '../components/ui/states';
import { Time } from '../components/ui/time';
import { useLineWatch } from './use-line-watch';

/** Shown while the server does not answer. */
export function OfflineBand() {
  const line = useLineWatch();
  if (line.isUp) return null;
  return (
    <Banner
      title={
        <>
          No line to the server since <Time at={line.since} />
        </>
      }
    >
      What is on screen may be older than that. Keep this page open: the line is tried again by itself.
    </Banner>
  );
}
