import type { ReactNode } from "react";
import { classNames } from "./class-names";

/** `note` says, `caution` warns, `error` failed, `done` worked. */
export type NoticeTone = "note" | "caution" | "error" | "done";

const TONES: Record<NoticeTone, string> = {
  note: "border-ink-3 bg-paper",
  caution: "border-brass bg-brass-tint text-brass-text",
  error: "border-red bg-red-tint",
  done: "border-ink bg-paper",
};

interface NoticeProps {
  readonly tone?: NoticeTone;
  readonly title?: ReactNode;
  readonly children?: ReactNode;
  /** `status` is read out when it appears, `alert` interrupts; leave out for what stands there from the start. */
  readonly role?: "status" | "alert";
  readonly className?: string;
}

/** A remark with a rule at its left: never by colour alone, the words say what it is. */
export function Notice({ tone = "note", title, children, role, className }: NoticeProps) {
  return (
    <div
      role={role}
      className={classNames("rounded-r border-l-4 px-3.5 py-2.5 text-sm", TONES[tone], className)}
    >
      {title ? <p className="font-semibold">{title}</p> : null}
      {children}
    </div>
  );
}
