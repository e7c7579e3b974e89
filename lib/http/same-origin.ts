/** Methods that must not change anything. */
const SAFE = new Set(["GET", "HEAD", "OPTIONS"]);

/** Meant to be called from elsewhere: they read no cookie. */
const OPEN = /^\/api\/(plan$|unsubscribe\/)/;

const originOf = (text: string): string | null => (URL.canParse(text) ? new URL(text).origin : null);

/**
 * True for a call that would change something and comes from a page of another site. Browsers say so in
 * `Sec-Fetch-Site`, older ones in `Origin`; a call with neither is no browser's and carries nobody's cookie by accident.
 * `own` are the addresses that people type; the host that the request names counts too.
 */
export function isForeignCall(request: Request, own: readonly string[]): boolean {
  const { pathname, protocol } = new URL(request.url);
  if (SAFE.has(request.method) || !pathname.startsWith("/api/") || OPEN.test(pathname)) return false;
  const site = request.headers.get("sec-fetch-site");
  if (site) return site !== "same-origin" && site !== "none";
  const origin = request.headers.get("origin");
  if (!origin) return false;
  const host = request.headers.get("host");
  const allowed = [...own, ...(host ? [`${protocol}//${host}`] : [])].map(originOf);
  return !allowed.includes(origin);
}
