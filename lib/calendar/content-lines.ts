/** Lines and text of RFC 5545 where the library falls short of it. */

const CRLF = "\r\n";
/** RFC 5545 3.1: octets of a line, its end not counted. */
const MOST_OCTETS = 75;

const octets = (codePoint: number): number =>
  codePoint < 0x80 ? 1 : codePoint < 0x800 ? 2 : codePoint < 0x10000 ? 3 : 4;

/**
 * Folds one content line (RFC 5545 3.1): at most 75 octets of UTF-8 a line, continued after CRLF and a space, never
 * inside a character.
 */
export function foldLine(line: string): string {
  let [folded, used] = ["", 0];
  for (const character of line) {
    const size = octets(character.codePointAt(0) ?? 0);
    if (used + size > MOST_OCTETS) {
      folded += `${CRLF} `;
      used = 1;
    }
    folded += character;
    used += size;
  }
  return folded;
}

/** Takes the library's folds, which count characters, back and folds by octets instead. */
export const refold = (text: string): string =>
  text.replaceAll(`${CRLF}\t`, "").split(CRLF).map(foldLine).join(CRLF);

/**
 * Text that can stand in a calendar: every kind of line break is a line feed, and control characters, which RFC 5545
 * 3.3.11 does not allow, are gone. Half of a surrogate pair becomes U+FFFD, as it would in UTF-8.
 */
export const cleanText = (text: string): string =>
  text
    .toWellFormed()
    .replace(/\r\n?|[\u0085\u2028\u2029]/g, "\n")
    .replace(/[\u0000-\u0008\u000b-\u001f\u007f-\u009f]/g, "");

/** Value of type TEXT (RFC 5545 3.3.11). */
export const escapeText = (text: string): string =>
  cleanText(text)
    .replace(/[\\;,]/g, "\\$&")
    .replaceAll("\n", "\\n");
