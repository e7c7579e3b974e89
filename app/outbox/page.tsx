import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { MailList } from "@/components/outbox/mail-list";
import { MailView } from "@/components/outbox/mail-view";
import { PageHead } from "@/components/shell/page-head";
import { PublicShell } from "@/components/shell/public-shell";
import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { env } from "@/lib/env";
import { listCaught, readCaught } from "@/lib/mail/outbox";

export const metadata: Metadata = { title: "Outbox", robots: { index: false } };

interface OutboxProps {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** Mails that the local catcher holds. Without a catcher, as in production, there is no such page. */
export default async function OutboxPage({ searchParams }: OutboxProps) {
  const { mail: wanted } = await searchParams;
  const dir = env().BELLWARD_OUTBOX_DIR;
  if (dir === undefined) notFound();
  const mails = await listCaught(dir);
  const openId = typeof wanted === "string" ? wanted : (mails[0]?.id ?? null);
  const open = openId === null ? null : await readCaught(dir, openId);
  if (typeof wanted === "string" && !open) notFound();
  return (
    <PublicShell>
      <PageHead
        title="Outbox"
        lead="Mails that would have gone out. They are caught on this machine; none has left it."
        actions={<LinkButton href="/outbox">Newest</LinkButton>}
      />
      {mails.length === 0 ? (
        <EmptyState title="No mail yet">
          <p>Move a session in a camp, or ask for a new password: the mail appears here.</p>
        </EmptyState>
      ) : (
        <div className="grid grid-cols-1 items-start gap-4 lg:grid-cols-[340px_minmax(0,1fr)]">
          <MailList mails={mails} openId={openId} />
          {open ? <MailView {...open} /> : null}
        </div>
      )}
    </PublicShell>
  );
}
