import { expect, it } from "vitest";
import { noneMatch } from "@/lib/http/entity-tag";

// Source: RFC 9110, sections 8.8.3 (syntax) and 13.1.2 (If-None-Match, compared weakly).
it.each([
  ['"abc"', true, "the tag itself"],
  ['W/"abc"', true, "a weak tag: compared weakly"],
  ['"x", "abc"', true, "second in a list"],
  ['"x",W/"abc" , "y"', true, "in a list with uneven spaces"],
  ["*", true, "anything"],
  [" * ", true, "anything, with spaces"],
  ['"ABC"', false, "another case"],
  ['"x"', false, "another tag"],
  ['"a,bc"', false, "a comma inside a tag is part of it"],
  ['"x,"abc""', false, "quotes that do not pair"],
  ["abc", false, "no quotes"],
  ['"*"', false, "a star in quotes is a tag"],
  ["", false, "nothing"],
])("If-None-Match %s gives %s: %s", (header, expected) => {
  expect(noneMatch(header, '"abc"')).toBe(expected);
});

it("no header never matches, and a weak current tag is compared weakly too", () => {
  expect(noneMatch(null, '"abc"')).toBe(false);
  expect(noneMatch('"abc"', 'W/"abc"')).toBe(true);
});
