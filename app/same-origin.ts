/** Whether a request that changes something comes from a page of this site (Fetch Metadata; else the Origin header). */
export function isFromHere(request: Request): boolean {
  const site = request.headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin';
  const origin = request.headers.get('origin');
  return origin !== null && URL.canParse(origin) && new URL(origin).host === request.headers.get('host');
}
