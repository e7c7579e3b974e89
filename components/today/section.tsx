import type { ReactNode } from "react";
import { KindMark } from "@/components/session/kind-mark";
import type { WorkLook } from "@/components/session/kinds";
import { classNames } from "@/components/ui/class-names";

interface SectionProps {
  readonly title: ReactNode;
  readonly look?: WorkLook | null;
  readonly lead?: ReactNode;
  readonly children?: ReactNode;
}

/** One sheet of the column: a session, the check-in, the weight. */
export function Section({ title, look, lead, children }: SectionProps) {
  return (
    <section className="border-b border-line bg-paper px-4.5 py-4">
      <h2 className="flex items-center gap-2.5 text-[19px] leading-tight font-semibold">
        {look ? <KindMark mark={look.mark} size={13} className={look.text} /> : null}
        {title}
      </h2>
      {lead ? <p className="mt-0.5 text-sm text-ink-2">{lead}</p> : null}
      {children}
    </section>
  );
}

interface StateWordProps {
  /** Something about it still waits on this phone. */
  readonly waiting: boolean;
  /** There is something to save at all. */
  readonly given: boolean;
  readonly className?: string;
}

/** Where an answer is: on the server, or only here. The state line at the top is what is read out. */
export function StateWord({ waiting, given, className }: StateWordProps) {
  return (
    <p className={classNames("min-h-5 text-sm text-ink-2", className)}>
      {given ? (waiting ? "Kept on this phone" : "Saved") : ""}
    </p>
  );
}
