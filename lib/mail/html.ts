/** Markup that is safe to put into a page as it is. Only `html` and `join` make it. */
export class Markup {
  constructor(readonly source: string) {}
  toString(): string {
    return this.source;
  }
}

const ENTITIES: Readonly<Record<string, string>> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};

const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (sign) => ENTITIES[sign] ?? sign);

type Part = string | number | Markup | null;

const sourceOf = (part: Part): string =>
  part instanceof Markup ? part.source : part === null ? "" : escapeHtml(String(part));

/** Template for HTML: everything put in is escaped, but what is `Markup` already. Null is nothing. */
export const html = (strings: TemplateStringsArray, ...parts: readonly Part[]): Markup =>
  new Markup(
    strings
      .map((text, index) => text + (index < parts.length ? sourceOf(parts[index] ?? null) : ""))
      .join(""),
  );

export const join = (parts: readonly Markup[]): Markup =>
  new Markup(parts.map((part) => part.source).join("\n"));
