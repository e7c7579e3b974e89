import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cleanText, escapeText, foldLine, refold } from "@/lib/calendar/content-lines";

const octets = (text: string): number => Buffer.byteLength(text, "utf8");
/** RFC 5545 3.1: a CRLF followed by one space or tab is taken out. */
const unfold = (text: string): string => text.replace(/\r\n[ \t]/g, "");

describe("folding", () => {
  it("counts octets, not characters: 60 two-octet letters are folded although they are 72 characters", () => {
    // 12 octets of name and colon and 31 letters are 74; 29 letters remain, after a space: 59.
    const folded = foldLine(`DESCRIPTION:${"é".repeat(60)}`).split("\r\n");
    expect(folded.map(octets)).toEqual([74, 59]);
    expect(folded[1]).toBe(` ${"é".repeat(29)}`);
  });

  it("keeps a line of 75 octets whole and folds one of 76", () => {
    expect(foldLine("a".repeat(75))).toBe("a".repeat(75));
    expect(foldLine("a".repeat(76))).toBe(`${"a".repeat(75)}\r\n a`);
  });

  it("reads back RFC 5545's own example from what it folds", () => {
    // Source: RFC 5545, section 3.1.
    const line = "DESCRIPTION:This is a long description that exists on a long line.";
    expect(unfold("DESCRIPTION:This is a lo\r\n ng description\r\n  that exists on a long line.")).toBe(line);
    expect(unfold(foldLine(line.repeat(5)))).toBe(line.repeat(5));
  });

  it("never has more than 75 octets a line, never splits a character and unfolds to what it was", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme", maxLength: 400 }), (text) => {
        const line = text.replace(/[\r\n]/g, "").toWellFormed();
        const folded = foldLine(line);
        expect(unfold(folded)).toBe(line);
        for (const part of folded.split("\r\n")) {
          expect(octets(part)).toBeLessThanOrEqual(75);
          expect(part.isWellFormed()).toBe(true);
        }
      }),
      { seed: 5545, numRuns: 500 },
    );
  });

  it("replaces the library's folds by its own", () => {
    const line = `SUMMARY:${"ž".repeat(100)}`;
    const byCharacters = `${line.slice(0, 75)}\r\n\t${line.slice(75)}\r\nEND:VEVENT\r\n`;
    expect(unfold(refold(byCharacters))).toBe(`${line}\r\nEND:VEVENT\r\n`);
    expect(refold(byCharacters)).not.toContain("\t");
  });
});

describe("text", () => {
  it("is escaped as RFC 5545 section 3.3.11 says, colons and quotes left alone", () => {
    expect(escapeText("Squat; 3x5, 85% \\ note\nnext")).toBe("Squat\\; 3x5\\, 85% \\\\ note\\nnext");
    expect(escapeText('Pads: "hard"')).toBe('Pads: "hard"');
  });

  it("has one kind of line break and no control characters but the tab", () => {
    expect(cleanText("a\r\nb\rc\nd\u2028e\u2029f\u0085g")).toBe("a\nb\nc\nd\ne\nf\ng");
    expect(cleanText("a\u0000\u0007\u000b\u001f\u007f\u009bb\tc")).toBe("ab\tc");
  });

  it("is what UTF-8 can hold", () => {
    expect(cleanText("a\ud83eb")).toBe("a\ufffdb");
  });
});
