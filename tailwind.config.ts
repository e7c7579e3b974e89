import type { Config } from "tailwindcss";

const token = (name: string): string => `var(--${name})`;

/**
 * The only colours, sizes and radii there are: values live in `app/globals.css`, light and dark, and this file gives
 * them class names. Colours name kinds of work (red hard contact and bout, blue weight and conditioning, iron strength,
 * brass power, gauze taper and primer), never the state of a person.
 */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    colors: {
      transparent: "transparent",
      current: "currentColor",
      inherit: "inherit",
      canvas: token("canvas"),
      paper: token("paper"),
      field: token("field"),
      line: { DEFAULT: token("line"), soft: token("line-soft") },
      // Outline of a control: 3:1 against paper and canvas (WCAG 2.2, 1.4.11).
      edge: token("edge"),
      ink: { DEFAULT: token("ink"), 2: token("ink-2"), 3: token("ink-3"), on: token("ink-on") },
      bar: {
        DEFAULT: token("bar"),
        text: token("bar-text"),
        quiet: token("bar-quiet"),
        line: token("bar-line"),
      },
      red: {
        DEFAULT: token("red"),
        fill: token("red-fill"),
        on: token("red-on"),
        text: token("red-text"),
        tint: token("red-tint"),
        edge: token("red-edge"),
      },
      blue: {
        DEFAULT: token("blue"),
        text: token("blue-text"),
        tint: token("blue-tint"),
        edge: token("blue-edge"),
      },
      iron: {
        DEFAULT: token("iron"),
        fill: token("iron-fill"),
        on: token("iron-on"),
        tint: token("iron-tint"),
      },
      brass: {
        DEFAULT: token("brass"),
        text: token("brass-text"),
        tint: token("brass-tint"),
        edge: token("brass-edge"),
        // The bell on the dark top bar.
        bell: token("brass-bell"),
      },
      gauze: {
        DEFAULT: token("gauze"),
        text: token("gauze-text"),
        tint: token("gauze-tint"),
        edge: token("gauze-edge"),
      },
    },
    borderRadius: { none: "0", DEFAULT: "3px", md: "4px" },
    boxShadow: { none: "none", drag: "0 6px 16px rgb(0 0 0 / 0.28)" },
    fontFamily: {
      // The ext subset first: next/font puts a metric fallback behind each family, and letters after it would be lost.
      sans: ["var(--font-hanken-ext)", "var(--font-hanken)", "system-ui", "sans-serif"],
      display: ["var(--font-league-ext)", "var(--font-league)", "Impact", "sans-serif"],
    },
    fontSize: {
      "2xs": ["11.5px", "1.3"],
      xs: ["12.5px", "1.35"],
      sm: ["13.5px", "1.4"],
      base: ["15px", "1.45"],
      lg: ["17px", "1.45"],
      xl: ["20px", "1.25"],
      "2xl": ["24px", "1.15"],
      // 16 px where a finger types: below that a phone zooms into the field.
      control: ["var(--control-text)", "1.3"],
      // League Gothic only.
      week: ["27px", "1"],
      wordmark: ["30px", "1"],
      bout: ["38px", "0.9"],
      count: ["112px", "0.78"],
      poster: ["clamp(68px, 19vw, 104px)", "0.84"],
    },
    extend: {
      spacing: {
        // 44 px under a finger, less under a mouse.
        control: "var(--control)",
        "control-small": "var(--control-small)",
      },
      maxWidth: { page: "1560px", prose: "68ch" },
    },
  },
};
export default config;
