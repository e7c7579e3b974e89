import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const ENGINE = path.resolve(import.meta.dirname, "../../lib/engine");
const files = readdirSync(ENGINE, { recursive: true, encoding: "utf8" }).filter((name) =>
  name.endsWith(".ts"),
);

/** Code without comments and texts: "Process" may be spoken of, not used. */
const codeOf = (name: string): string =>
  readFileSync(path.join(ENGINE, name), "utf8")
    .replace(/\/\*[\s\S]*?\*\//g, "")
    .replace(/(^|\s)\/\/.*$/gm, "");
const withoutTexts = (code: string): string => code.replace(/"(?:[^"\\\n]|\\.)*"|'(?:[^'\\\n]|\\.)*'/g, '""');

describe("the engine is pure", () => {
  it("there is something to look at", () => {
    expect(files.length).toBeGreaterThan(20);
  });

  it.each(files)("%s knows no clock, no chance, no locale and no machine", (name) => {
    const code = withoutTexts(codeOf(name));
    expect(code).not.toMatch(/\b(Date|Intl|process|globalThis|fetch|setTimeout|crypto|console)\b/);
    expect(code).not.toMatch(
      /\b(window|document|performance)\s*\.|Math\s*\.\s*random|toLocale|localeCompare|\brequire\b/,
    );
  });

  it.each(files)("%s imports nothing from outside the engine", (name) => {
    const pattern =
      /^(?:import|export|\}).*\bfrom "([^"]+)";$|^import "([^"]+)";$|\bimport\s*\(\s*"([^"]+)"/gm;
    const imports = [...codeOf(name).matchAll(pattern)].map(
      (match) => match[1] ?? match[2] ?? match[3] ?? "",
    );
    for (const target of imports) {
      expect(target).toMatch(/^\.\.?\//);
      const resolved = path.resolve(ENGINE, path.dirname(name), target);
      expect(resolved.startsWith(ENGINE)).toBe(true);
    }
  });
});
