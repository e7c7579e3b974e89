import { classNames } from "@/components/ui/class-names";
import { KindMark } from "./kind-mark";
import type { WorkLook } from "./kinds";

export interface ChipState {
  /** Where the session stood before what is being dragged: outline only. */
  readonly ghost?: boolean;
  /** Where it lands. */
  readonly moved?: boolean;
  /** A coach put it there. */
  readonly pinned?: boolean;
  /** The pin breaks a must rule. */
  readonly broken?: boolean;
  readonly past?: boolean;
  /** Its details are open, or its twin on the ropes is pointed at. */
  readonly marked?: boolean;
  /** Picked up by mouse or key. */
  readonly held?: boolean;
}

interface SessionChipProps extends ChipState {
  readonly look: WorkLook;
  /** Where it says more than the kind: "Pads", "Clinch drills". */
  readonly title?: string;
  /** "18:00"; left out where the grid is too small for it. */
  readonly time?: string;
  /** On a phone the mark stands alone; the words stay for screen readers. */
  readonly markOnPhone?: boolean;
}

const Pin = () => (
  <svg width="9" height="9" viewBox="0 0 10 10" aria-hidden="true" className="shrink-0">
    <path d="M3 .8h4L6.4 4.2 8 6H2l1.6-1.8zM5 6v3.6" fill="none" stroke="currentColor" strokeWidth="1.3" />
  </svg>
);

/** One session in a calendar cell: mark, title, time. Looks only; whoever places it makes it a button or draggable. */
export function SessionChip({ look, title = look.label, time, markOnPhone, ...state }: SessionChipProps) {
  return (
    <span
      className={classNames(
        "flex w-full items-center gap-1.5 rounded border px-1.5 py-[3px] text-left text-xs leading-tight",
        state.ghost ? "border-dashed border-ink bg-transparent text-ink opacity-60" : look.chip,
        // No opacity: what is past must stay readable; its day is hatched besides.
        state.past && "saturate-50",
        (state.moved || state.marked) && "outline-2 outline-offset-1 outline-ink",
        state.held && "shadow-drag",
        markOnPhone && "max-sm:min-h-control max-sm:justify-center max-sm:px-0",
      )}
    >
      <KindMark mark={look.mark} size={9} className={markOnPhone ? "max-sm:size-3.5" : undefined} />
      <span
        className={classNames("min-w-0 flex-1 break-words hyphens-auto", markOnPhone && "max-sm:sr-only")}
      >
        {title}
        {state.ghost ? <span className="sr-only">, stood here before</span> : null}
        {state.broken ? <span className="block font-semibold">breaks a rule</span> : null}
      </span>
      {state.pinned ? (
        <>
          <Pin />
          <span className="sr-only">pinned</span>
        </>
      ) : null}
      {time ? <span className={classNames("shrink-0", markOnPhone && "max-sm:sr-only")}>{time}</span> : null}
    </span>
  );
}
