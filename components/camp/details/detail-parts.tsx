import type { ReactNode } from "react";
import { KindMark } from "@/components/session/kind-mark";
import type { WorkLook } from "@/components/session/kinds";
import { Cross } from "@/components/ui/icons";
import { LinkButton } from "@/components/ui/link-button";

interface DetailHeadProps {
  readonly look: WorkLook;
  readonly title: string;
  readonly when: string;
  readonly facts: string;
  readonly onClose: () => void;
}

/** What a session is: mark, title, when, how much. */
export function DetailHead({ look, title, when, facts, onClose }: DetailHeadProps) {
  return (
    <header className="flex items-start gap-2.5 px-4 pt-3.5 pb-2">
      <KindMark mark={look.mark} size={13} className={`mt-1 ${look.text}`} />
      <div className="min-w-0 flex-1">
        <h2 className="leading-tight font-semibold">{title}</h2>
        <p className="text-sm text-ink-2">{when}</p>
        {facts ? <p className="text-sm text-ink-2">{facts}</p> : null}
      </div>
      <button
        type="button"
        aria-label="Close the details"
        onClick={onClose}
        className="-mt-1 -mr-2 flex min-h-control-small min-w-control-small items-center justify-center rounded hover:bg-line-soft"
      >
        <Cross />
      </button>
    </header>
  );
}

/** To the page of a session: what is asked, and what was logged. */
export const OpenSession = ({ campId, id }: { readonly campId: string; readonly id: string }) => (
  <p className="px-4 pb-3">
    <LinkButton size="small" href={`/camps/${campId}/sessions/${encodeURIComponent(id)}`}>
      Open the session
    </LinkButton>
  </p>
);

interface PartProps {
  readonly title: string;
  readonly children: ReactNode;
}

/** One question about a session and its answer. */
export function DetailPart({ title, children }: PartProps) {
  return (
    <section className="border-t border-line-soft px-4 py-3">
      <h3 className="mb-1.5 text-xs font-semibold text-ink-2">{title}</h3>
      {children}
    </section>
  );
}
