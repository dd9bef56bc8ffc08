import 'server-only';

/**
 * Whether a request that changes something comes from our own pages.
 *
 * Browsers say so in Sec-Fetch-Site; where it is missing the Origin must be our own. A request with neither is
 * refused: another site's form could have sent it with the person's cookie.
 */
export function isSameOrigin(headers: Headers): boolean {
  const site = headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin';
  const origin = headers.get('origin');
  if (origin === null) return false;
  if (!URL.canParse(origin)) return false;
  const configured = process.env.APP_ORIGIN;
  if (configured && URL.canParse(configured)) return new URL(origin).origin === new URL(configured).origin;
  return new URL(origin).host === headers.get('host');
}
