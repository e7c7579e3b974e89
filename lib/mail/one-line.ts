/** Text as one line: a line break in a title must not begin a header of its own. Control characters become spaces. */
export const oneLine = (text: string): string =>
  text
    .replace(/[\p{Cc}\u2028\u2029]+/gu, " ")
    .replace(/ {2,}/g, " ")
    .trim();
