import { html, join, Markup } from "./html";

/**
 * The look of every mail: ink on paper, hairlines, no images. Styles are inline because mail programs drop sheets; the one
 * sheet only repaints for a dark scheme where it is read.
 */
const FONT = "font-family:'Hanken Grotesk',-apple-system,'Segoe UI',Roboto,Helvetica,Arial,sans-serif";
export const STYLE = {
  text: `margin:0 0 12px;${FONT};font-size:15px;line-height:1.5;color:#12171c`,
  quiet: `margin:0;${FONT};font-size:13px;line-height:1.5;color:#46525b`,
  heading: `margin:0 0 12px;${FONT};font-size:20px;line-height:1.25;font-weight:600;color:#12171c`,
  subheading: `margin:0 0 2px;${FONT};font-size:16px;line-height:1.3;font-weight:600;color:#12171c`,
  button: `display:inline-block;padding:10px 16px;border-radius:3px;background:#12171c;color:#fbfcfc;${FONT};font-size:15px;font-weight:600;text-decoration:none`,
  link: "color:#1b4f9c;text-decoration:underline",
  rule: "border-top:1px solid #c6ced2",
} as const;

const DARK = `@media (prefers-color-scheme: dark) {
.canvas{background:#0c1013!important}.paper{background:#12171c!important;border-color:#2b3a46!important}
.ink{color:#eef1f2!important}.quiet{color:#aeb9c0!important}.rule{border-color:#2b3a46!important}
.link{color:#8db4ec!important}.button{background:#eef1f2!important;color:#12171c!important}
}`;

export interface Letter {
  readonly title: string;
  readonly body: Markup;
  /** Small print under the hairline. */
  readonly footer: Markup;
}

/** A whole HTML document for a mail. */
export function letterHtml({ title, body, footer }: Letter): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width" />
        <meta name="color-scheme" content="light dark" />
        <meta name="supported-color-schemes" content="light dark" />
        <title>${title}</title>
        <style>
          ${new Markup(DARK)}
        </style>
      </head>
      <body class="canvas" style="margin:0;padding:24px 12px;background:#dfe4e6">
        <table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0">
          <tr>
            <td align="center">
              <table
                role="presentation"
                class="paper"
                width="100%"
                cellpadding="0"
                cellspacing="0"
                border="0"
                style="max-width:600px;background:#fbfcfc;border:1px solid #c6ced2;border-radius:4px"
              >
                <tr>
                  <td align="left" style="padding:24px">
                    <p
                      class="ink"
                      style="margin:0 0 16px;${new Markup(FONT)};font-size:13px;font-weight:700;letter-spacing:.12em;text-transform:uppercase;color:#12171c"
                    >
                      Bellward
                    </p>
                    ${body}
                    <div class="rule" style="${STYLE.rule};margin-top:20px;padding-top:12px">${footer}</div>
                  </td>
                </tr>
              </table>
            </td>
          </tr>
        </table>
      </body>
    </html> `.source;
}

export const paragraph = (content: string | Markup): Markup =>
  html`<p class="ink" style="${STYLE.text}">${content}</p>`;
export const quiet = (content: string | Markup): Markup =>
  html`<p class="quiet" style="${STYLE.quiet}">${content}</p>`;
export const link = (label: string, url: string): Markup =>
  html`<a class="link" href="${url}" style="${STYLE.link}">${label}</a>`;
export const button = (label: string, url: string): Markup =>
  html`<p style="margin:16px 0 4px"><a class="button" href="${url}" style="${STYLE.button}">${label}</a></p>`;

export interface Note {
  readonly heading: string;
  readonly paragraphs: readonly string[];
  /** The one thing to do. */
  readonly action?: { readonly label: string; readonly url: string };
  /** Why this mail came. */
  readonly footer: string;
}

/** A short letter with at most one button, as text and as HTML: reset, invitation and the like. */
export function noteMail({ heading, paragraphs, action, footer }: Note): { text: string; html: string } {
  const text = [
    heading,
    ...paragraphs,
    ...(action ? [`${action.label}:\n${action.url}`] : []),
    `-- \n${footer}`,
  ].join("\n\n");
  const body = join([
    html`<h1 class="ink" style="${STYLE.heading}">${heading}</h1>`,
    ...paragraphs.map(paragraph),
    ...(action ? [button(action.label, action.url), quiet(link(action.url, action.url))] : []),
  ]);
  return { text: `${text}\n`, html: letterHtml({ title: heading, body, footer: quiet(footer) }) };
}
