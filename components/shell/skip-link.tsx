/** First stop of the Tab key: past the head of the page. The page's `main` carries the id. */
export const MAIN_ID = "main";

export const SkipLink = () => (
  <a
    href={`#${MAIN_ID}`}
    className="sr-only z-50 rounded border border-ink bg-paper px-4 py-2.5 font-semibold text-ink focus:not-sr-only focus:absolute focus:top-2 focus:left-2"
  >
    Skip to content
  </a>
);
