/** Milliseconds the server's clock is ahead of this tablet's. A tablet's clock may be an hour wrong; load times may not. */
let aheadMs = 0;

/** Below this the difference is the second that the Date header rounds away, and the way here. */
const noticeMs = 5_000;

/** Learns from the Date header of a reply (RFC 9110, section 6.6.1). */
export function noteServerTime(dateHeader: string | null, receivedAtMs: number): void {
  if (dateHeader === null) return;
  const serverMs = Date.parse(dateHeader);
  if (Number.isNaN(serverMs)) return;
  const difference = serverMs - receivedAtMs;
  aheadMs = Math.abs(difference) < noticeMs ? 0 : difference;
}

/** Now, as the server sees it. */
export function serverNow(): Date {
  return new Date(Date.now() + aheadMs);
}
