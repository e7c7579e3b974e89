import { DoseFacts } from "@/components/session/session-why";
import { Panel } from "@/components/ui/panel";
import type { LiftView } from "@/lib/schemas/prescription";

/** Why the session stands where it stands and has the sets that it has. */
export function WhyPart({ lift: view }: { readonly lift: LiftView }) {
  const { lift, violations } = view;
  return (
    <Panel>
      <h2 className="mb-1.5 font-semibold">Why it stands here</h2>
      <ul className="grid gap-1 text-sm">
        {violations.map(({ rule, text }) => (
          <li key={rule} className="font-semibold">
            Breaks a rule: {text}
          </li>
        ))}
        {lift.reasons.map(({ rule, text }) => (
          <li key={`${rule} ${text}`}>{text}</li>
        ))}
        {lift.reasons.length + violations.length === 0 ? <li>Nothing else is near it.</li> : null}
        {lift.pinned ? <li>Pinned by a coach: the planner leaves it here.</li> : null}
      </ul>
      <h2 className="mt-4 mb-1.5 font-semibold">Why it has {lift.sets} sets</h2>
      <DoseFacts lift={lift} />
    </Panel>
  );
}
