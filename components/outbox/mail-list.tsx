import Link from "next/link";
import { classNames } from "@/components/ui/class-names";
import { formatInstant } from "@/lib/format/dates";

interface OutboxEntry {
  readonly id: string;
  /** ISO instant. */
  readonly receivedAt: string;
  readonly subject: string;
  readonly envelope: { readonly to: readonly string[] };
}

interface MailListProps {
  readonly mails: readonly OutboxEntry[];
  readonly openId: string | null;
}

/** Caught mails, newest first; times in UTC, as the files have them. */
export function MailList({ mails, openId }: MailListProps) {
  return (
    <nav aria-label="Caught mails">
      <ol className="rounded-md border border-line bg-paper">
        {mails.map((mail) => {
          const open = mail.id === openId;
          return (
            <li key={mail.id} className="border-t border-line-soft first:border-t-0">
              <Link
                href={`/outbox?mail=${mail.id}`}
                aria-current={open ? "page" : undefined}
                className={classNames("block px-4 py-2.5 hover:bg-line-soft", open && "bg-line-soft")}
              >
                <span className="block font-semibold break-words">{mail.subject}</span>
                <span className="block text-xs break-words text-ink-2">
                  {mail.envelope.to.join(", ")} · {formatInstant(new Date(mail.receivedAt), "UTC")} UTC
                </span>
              </Link>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
