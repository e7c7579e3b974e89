/** What the browser may load and do on our pages. */
export function contentPolicy(nonce: string, { development = false } = {}): string {
  const rules = {
    "default-src": "'self'",
    // React's development build evaluates strings for its stack traces.
    "script-src": `'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`,
    // The calendar and the dialogs put style elements of their own into the page.
    "style-src": "'self' 'unsafe-inline'",
    "img-src": "'self' data: blob:",
    // The calendar brings its arrows as a font in its style sheet.
    "font-src": "'self' data:",
    "connect-src": `'self'${development ? " ws:" : ""}`,
    "worker-src": "'self'",
    "manifest-src": "'self'",
    "object-src": "'none'",
    "base-uri": "'none'",
    "form-action": "'self'",
    "frame-src": "'none'",
    "frame-ancestors": "'none'",
  };
  return Object.entries(rules)
    .map(([name, value]) => `${name} ${value}`)
    .join("; ");
}

/** Two years, as browsers' preload lists ask for at least one. */
export const STRICT_TRANSPORT = "max-age=63072000; includeSubDomains";
