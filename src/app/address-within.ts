/** Where to go after a sign-in: an address of this application only, however it was written into the link. */
export function addressWithin(wanted: string | null): string {
  if (wanted === null) return '/';
  const here = window.location.origin;
  const url = URL.canParse(wanted, here) ? new URL(wanted, here) : null;
  if (url === null || url.origin !== here || url.pathname === '/sign-in') return '/';
  return url.pathname + url.search;
}
