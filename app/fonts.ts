import localFont from "next/font/local";

// Letters beyond Latin-1 (č ć đ ž š ł ő …) lie in a file of their own, fetched only where a page uses one of them.

const hanken = localFont({
  src: "../node_modules/@fontsource-variable/hanken-grotesk/files/hanken-grotesk-latin-wght-normal.woff2",
  weight: "100 900",
  variable: "--font-hanken",
  display: "swap",
});

const hankenExt = localFont({
  src: "../node_modules/@fontsource-variable/hanken-grotesk/files/hanken-grotesk-latin-ext-wght-normal.woff2",
  weight: "100 900",
  variable: "--font-hanken-ext",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: "unicode-range", value: "U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+1E00-1E9F,U+20A0-20AB" },
  ],
});

const league = localFont({
  src: "../node_modules/@fontsource/league-gothic/files/league-gothic-latin-400-normal.woff2",
  weight: "400",
  variable: "--font-league",
  display: "swap",
});

const leagueExt = localFont({
  src: "../node_modules/@fontsource/league-gothic/files/league-gothic-latin-ext-400-normal.woff2",
  weight: "400",
  variable: "--font-league-ext",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: "unicode-range", value: "U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+1E00-1E9F,U+20A0-20AB" },
  ],
});

/** Classes that define the font variables of `tailwind.config.ts`; for the html element. */
export const fontVariables = [hanken, hankenExt, league, leagueExt].map((font) => font.variable).join(" ");
