import { html, join, type Markup } from "./html";
import { STYLE, button, letterHtml, link, paragraph, quiet } from "./layout";
import { unsubscribeUrls } from "./list-headers";
import { oneLine } from "./one-line";
import { mailSettings } from "./settings";
import type { ChangeLine } from "./change-lines";
import type { CampSection } from "./change-section";

/** Sessions listed per camp; the camp page has the rest. A called-off camp may touch sixty. */
const MOST_LINES = 30;

const plural = (count: number, one: string): string => `${count} ${one}${count === 1 ? "" : "s"}`;
const listed = (names: readonly string[]): string =>
  names
    .map(oneLine)
    .join(", ")
    .replace(/, ([^,]*)$/, " and $1");
const firstName = (name: string): string => oneLine(name).split(" ")[0] ?? "";
const whose = ({ own, athleteName }: CampSection): string => (own ? "Your" : `${firstName(athleteName)}'s`);
const campUrl = (campId: string): string => `${mailSettings().appUrl}/camps/${campId}`;

/** Says how much changed and nothing of what: a subject is read on a locked screen. */
function subjectOf(sections: readonly CampSection[]): string {
  const sessions = sections.reduce((sum, section) => sum + section.lines.length, 0);
  const [only, second] = sections;
  if (!only || second) return `${plural(sections.length, "camp")}: ${plural(sessions, "session")} changed`;
  const camp = `${whose(only)} camp`;
  if (only.off) return `${camp}: the bout is off`;
  const parts = [
    ...(only.bout.length > 0 ? ["the bout"] : []),
    ...(sessions > 0 ? [plural(sessions, "session")] : []),
  ];
  return `${camp}: ${parts.join(" and ")} changed`;
}

/** What stands above the sessions: title, who saved it, the bout. A camp that is off lists no session by itself. */
function headOf(section: CampSection) {
  const title = oneLine(
    section.opponent ? `${section.athleteName} v ${section.opponent}` : section.athleteName,
  );
  const by = section.savedBy.length > 0 ? `Saved by ${listed(section.savedBy)}.` : null;
  const shown = section.off ? [] : section.lines.slice(0, MOST_LINES);
  const rest = section.lines.length - shown.length;
  const more = section.off
    ? section.lines.length > 0
      ? `${plural(section.lines.length, "session")} ahead ${section.lines.length === 1 ? "is" : "are"} taken out.`
      : null
    : rest > 0
      ? `And ${plural(rest, "more session")}: the camp page shows all.`
      : null;
  return {
    title,
    by,
    bout: section.bout.map(oneLine),
    shown,
    more,
    broken: section.broken.map((text) => `Against the house rules: ${oneLine(text)}`),
  };
}

const lineText = ({ title, url, what, sets, why }: ChangeLine): string =>
  [
    oneLine(title),
    ...[what, sets, ...why, url].flatMap((part) => (part === null ? [] : [`  ${oneLine(part)}`])),
  ].join("\n");

function sectionText(section: CampSection): string {
  const { title, by, bout, shown, more, broken } = headOf(section);
  const head = [title, ...(by ? [by] : []), ...bout].join("\n");
  return [
    head,
    ...shown.map(lineText),
    ...(more ? [more] : []),
    ...broken,
    `The camp: ${campUrl(section.campId)}`,
  ].join("\n\n");
}

const lineHtml = ({ title, url, what, sets, why }: ChangeLine): Markup =>
  html`<div class="rule" style="${STYLE.rule};padding:10px 0">
    <p class="ink" style="${STYLE.text};margin:0;font-weight:600">${link(oneLine(title), url)}</p>
    <p class="ink" style="${STYLE.text};margin:0">
      ${oneLine(what)}${sets === null ? null : html`<br />${sets}`}
    </p>
    ${join(why.map((reason) => quiet(oneLine(reason))))}
  </div>`;

function sectionHtml(section: CampSection): Markup {
  const { title, by, bout, shown, more, broken } = headOf(section);
  return join([
    html`<h2 class="ink" style="${STYLE.subheading}">${title}</h2>`,
    ...(by ? [quiet(by)] : []),
    ...bout.map((text) => paragraph(html`<b>${text}</b>`)),
    html`<div style="margin-top:10px">${join(shown.map(lineHtml))}</div>`,
    ...(more ? [paragraph(more)] : []),
    ...broken.map(paragraph),
    button(section.own ? "Open your camp" : "Open the camp", campUrl(section.campId)),
  ]);
}

/** One mail about everything that waits for one reader, as text and as HTML with the same facts. */
export function changeMail(reader: { userId: string; timeZone: string }, sections: readonly CampSection[]) {
  const subject = subjectOf(sections);
  const { page } = unsubscribeUrls(reader.userId);
  const settings = `${mailSettings().appUrl}/settings`;
  const zone = `Times are in ${reader.timeZone}, the time zone of your account.`;
  const text = [
    subject,
    ...sections.map(sectionText),
    `-- \n${zone}\nOne mail for each change, one a day or none: ${settings}\nStop these mails: ${page}`,
  ].join("\n\n");
  const body = join([
    html`<h1 class="ink" style="${STYLE.heading}">${subject}</h1>`,
    ...sections.map(sectionHtml),
  ]);
  const footer = join([
    quiet(zone),
    quiet(
      html`${link("One mail for each change, one a day or none", settings)} ·
      ${link("Stop these mails", page)}`,
    ),
  ]);
  return { subject, text: `${text}\n`, html: letterHtml({ title: subject, body, footer }) };
}
