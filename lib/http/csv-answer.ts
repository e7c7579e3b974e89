/** A CSV file to keep, not to look at. */
export interface CsvFile {
  /** Without its ending; any characters. */
  readonly name: string;
  readonly text: string;
}

/** What old clients get as the name: letters, digits, dash and dot. */
const plain = (name: string): string =>
  name
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .replace(/[^A-Za-z0-9.]+/g, "-")
    .replace(/^-+|-+$/g, "") || "file";

/** RFC 8187 value: what `encodeURIComponent` leaves and the grammar does not. */
const extended = (name: string): string =>
  encodeURIComponent(name.toWellFormed()).replace(
    /['()*]/g,
    (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`,
  );

/** The answer that a browser saves under the file's name (RFC 6266). */
export const csvAnswer = ({ name, text }: CsvFile): Response =>
  new Response(text, {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="${plain(name)}.csv"; filename*=UTF-8''${extended(name)}.csv`,
      "cache-control": "no-store",
    },
  });
