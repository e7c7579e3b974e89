import type { ReactNode } from "react";
import { KindMark } from "@/components/session/kind-mark";
import { ITEM_LOOKS, SPORT_LOOKS, weekTitle, type WorkLook } from "@/components/session/kinds";
import type { KnockOn, LiftEffect, Reason, SportEffect } from "@/lib/engine/types";
import { effectMove } from "./words";

/** More sport sessions than these are folded: a change of a whole series moves the same session again and again. */
const SPORT_SHOWN = 3;

interface RowProps {
  readonly look?: Pick<WorkLook, "mark" | "text">;
  readonly title: string;
  readonly move?: string;
  /** "14 → 10". */
  readonly delta?: string | null;
  readonly because?: readonly Reason[];
}

function Row({ look, title, move, delta, because = [] }: RowProps) {
  return (
    <li className="grid grid-cols-[14px_minmax(0,1fr)_auto] items-start gap-x-2 border-t border-line-soft py-2 first:border-0">
      {look ? <KindMark mark={look.mark} size={11} className={`mt-1 ${look.text}`} /> : <span />}
      <div className="min-w-0">
        <p>
          <b className="font-semibold">{title}</b> {move}
        </p>
        {because.map((reason) => (
          <p key={`${reason.rule} ${reason.text}`} className="text-xs text-ink-2">
            {reason.text}
          </p>
        ))}
      </div>
      {delta ? <span className="font-semibold whitespace-nowrap">{delta}</span> : null}
    </li>
  );
}

const setsText = ({ setsBefore, setsAfter }: LiftEffect): string | null => {
  if (setsBefore === null || setsAfter === null) return setsAfter === null ? null : `${setsAfter}`;
  return `${setsBefore} → ${setsAfter}`;
};

function SportRows({ effects }: { readonly effects: readonly SportEffect[] }) {
  const rest = effects.length - SPORT_SHOWN;
  return (
    <>
      {effects.slice(0, rest > 1 ? SPORT_SHOWN : effects.length).map((effect) => (
        <Row
          key={effect.id}
          look={SPORT_LOOKS[effect.sport]}
          title={effect.title}
          move={effectMove(effect)}
        />
      ))}
      {rest > 1 ? <Row title={`and ${rest} more sport sessions`} /> : null}
    </>
  );
}

function Section({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section className="border-t border-line px-4 py-3">
      <h3 className="text-xs font-semibold text-ink-2">{title}</h3>
      <ul className="mt-1 text-sm">{children}</ul>
    </section>
  );
}

interface EffectListProps {
  readonly knockOn: KnockOn;
  /** The session that is being changed, named in the head already. */
  readonly subject: string | null;
}

/** Every effect of a change with its reason: sessions, week totals, and the rules it breaks. */
export function EffectList({ knockOn, subject }: EffectListProps) {
  const sport = knockOn.sport.filter((effect) => effect.id !== subject || effect.kind === "edited");
  const lifts = knockOn.lifts;
  return (
    <>
      {lifts.length + sport.length + knockOn.weeks.length > 0 ? (
        <Section title="What it knocks on">
          <SportRows effects={sport} />
          {lifts.map((effect) => (
            <Row
              key={effect.id}
              look={ITEM_LOOKS[effect.item]}
              title={ITEM_LOOKS[effect.item].label}
              move={effectMove(effect)}
              delta={setsText(effect)}
              because={effect.because}
            />
          ))}
          {knockOn.weeks.map((week) => (
            <Row
              key={`week ${week.weeksOut}`}
              title={`${weekTitle(week.weeksOut)}, in all`}
              delta={`${week.setsBefore} → ${week.setsAfter}`}
              because={week.because}
            />
          ))}
        </Section>
      ) : null}
      {knockOn.violations.length > 0 ? (
        <Section title="Rules it breaks">
          {knockOn.violations.map((violation) => (
            <Row
              key={`${violation.rule} ${violation.ids.join(" ")}`}
              title="Breaks a rule."
              move={violation.text}
            />
          ))}
        </Section>
      ) : null}
    </>
  );
}
