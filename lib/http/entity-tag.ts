/** Each entity tag in a list: the weak mark, then the opaque part, which may itself hold a comma (RFC 9110 8.8.3). */
const TAGS = /(?:W\/)?("[\x21\x23-\x7e\x80-\xff]*")/g;

/**
 * True where `If-None-Match` names the current tag: `*`, or a list compared weakly, so that `W/` makes no difference and
 * case does (RFC 9110 13.1.2).
 */
export function noneMatch(header: string | null, etag: string): boolean {
  if (header === null) return false;
  if (header.trim() === "*") return true;
  const current = etag.replace(/^W\//, "");
  return [...header.matchAll(TAGS)].some(([, opaque]) => opaque === current);
}
