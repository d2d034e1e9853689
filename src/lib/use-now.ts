import { useEffect, useState } from 'react';
import { serverNow } from './server-clock';

/** The present, told anew at each full minute or second. */
export function useNow(every: 'minute' | 'second' = 'minute'): Date {
  const [now, setNow] = useState(serverNow);
  useEffect(() => {
    const stepMs = every === 'minute' ? 60_000 : 1_000;
    let timer = 0;
    const wait = () => {
      timer = window.setTimeout(
        () => {
          setNow(serverNow());
          wait();
        },
        stepMs - (serverNow().getTime() % stepMs),
      );
    };
    wait();
    return () => {
      window.clearTimeout(timer);
    };
  }, [every]);
  return now;
}
