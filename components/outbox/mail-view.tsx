import { Panel } from "@/components/ui/panel";

interface MailViewProps {
  readonly subject: string;
  readonly headers: readonly { readonly name: string; readonly value: string }[];
  readonly text: string;
  readonly html: string | null;
  readonly links: readonly string[];
}

/** Links of the mail open in a tab of their own; the frame itself may run nothing and knows no origin. */
const framed = (html: string): string => html.replace(/<head>/i, '<head><base target="_blank">');

/** One caught mail: as HTML, as text, its links and its headers. */
export function MailView({ subject, headers, text, html, links }: MailViewProps) {
  return (
    <article className="flex min-w-0 flex-col gap-4" aria-label={subject}>
      {html === null ? null : (
        <Panel title="As HTML">
          <iframe
            title={`Mail: ${subject}`}
            srcDoc={framed(html)}
            sandbox="allow-popups allow-popups-to-escape-sandbox"
            className="h-[640px] w-full rounded border border-line"
          />
        </Panel>
      )}
      <Panel title="As text">
        <pre className="font-sans text-sm break-words whitespace-pre-wrap">{text}</pre>
      </Panel>
      <Panel title="Links">
        {links.length === 0 ? (
          <p className="text-ink-2">This mail has no links.</p>
        ) : (
          <ul className="flex flex-col gap-1.5 text-sm">
            {links.map((link) => (
              <li key={link}>
                <a href={link} className="break-all text-blue-text underline">
                  {link}
                </a>
              </li>
            ))}
          </ul>
        )}
      </Panel>
      <Panel title="Headers">
        <dl className="grid grid-cols-1 gap-x-4 gap-y-1 text-sm md:grid-cols-[max-content_minmax(0,1fr)]">
          {headers.map(({ name, value }, index) => (
            <div key={`${name}-${index}`} className="contents">
              <dt className="font-semibold">{name}</dt>
              <dd className="mb-1 break-all text-ink-2 md:mb-0">{value}</dd>
            </div>
          ))}
        </dl>
      </Panel>
    </article>
  );
}
