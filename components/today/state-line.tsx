import { buttonLook } from "@/components/ui/button-look";
import { PageLink } from "@/components/ui/page-link";
import { countOf, type Queue } from "@/lib/offline/queue";

interface StateLineProps {
  readonly queue: Queue;
  readonly online: boolean;
  readonly signedOut: boolean;
  /** The page opens without a net. */
  readonly opens: boolean;
  readonly durable: boolean;
}

export const entriesText = (count: number): string => (count === 1 ? "1 entry" : `${count} entries`);

function wordsOf({ queue, online, signedOut, opens, durable }: StateLineProps): string {
  const { waiting, stale, refused } = countOf(queue);
  if (waiting > 0 && !durable)
    return `${entriesText(waiting)} not sent. This browser keeps nothing: leave the page open.`;
  if (waiting > 0 && signedOut) return `${entriesText(waiting)} kept on this phone.`;
  if (waiting > 0 && online) return "Saving";
  if (waiting > 0) return `${entriesText(waiting)} ${waiting === 1 ? "waits" : "wait"} for the net`;
  if (stale + refused > 0) return `${entriesText(stale + refused)} to look at`;
  if (!online) return "No net. What you log is kept on this phone.";
  return opens ? "Saved. Opens without a net too." : "Saved";
}

/** How this phone and the server stand; read out when it changes. */
export function StateLine(props: StateLineProps) {
  return (
    <div className="border-b border-line bg-canvas px-4.5 py-2 text-sm text-ink-2">
      <p role="status" data-opens={props.opens ? "true" : undefined}>
        {wordsOf(props)}
      </p>
      {props.signedOut ? (
        <div className="mt-1.5 flex items-center justify-between gap-3 pb-1">
          <p>Your session has ended. Sign in again; nothing is lost.</p>
          <PageLink href="/sign-in?next=/today" className={buttonLook({ variant: "primary" })}>
            Sign in
          </PageLink>
        </div>
      ) : null}
    </div>
  );
}
