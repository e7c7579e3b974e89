import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { dayFromIso } from "@/lib/engine/geometry";
import { longDayText } from "@/lib/format/civil";
import type { ReportView } from "@/lib/schemas/report";
import { RESULT_WORDS } from "./words";

interface ResultPanelProps {
  readonly report: ReportView;
  /** Null for who may not write it down. */
  readonly onRecord: (() => void) | null;
}

/** How the bout ended, and how long contact stands down. */
export function ResultPanel({ report, onRecord }: ResultPanelProps) {
  const { result, standDown } = report;
  const record = onRecord ? (
    <Button size="small" variant={result ? "plain" : "primary"} className="print:hidden" onClick={onRecord}>
      {result ? "Change it" : "Write down how it ended"}
    </Button>
  ) : null;
  return (
    <Panel title="The bout" actions={report.off ? null : record}>
      {report.off ? <p>The bout was called off.</p> : null}
      {!report.off && !result ? <p className="text-ink-2">Nobody has written down how it ended.</p> : null}
      {result ? (
        <>
          <p className="text-lg font-semibold">
            {RESULT_WORDS[result.result]}
            {result.how === "" ? "" : `, ${result.how}`}
          </p>
          {result.note === "" ? null : <p className="mt-1 whitespace-pre-line">{result.note}</p>}
        </>
      ) : null}
      {standDown ? (
        <Notice
          tone="caution"
          title={`No contact until ${longDayText(dayFromIso(standDown.eligible))}`}
          className="mt-3"
        >
          {standDown.days} days were ordered, counted from the day after the bout; the last is{" "}
          {longDayText(dayFromIso(standDown.to))}. The date alone is no medical clearance: a doctor decides,
          in person.
        </Notice>
      ) : null}
      {result?.stopped && !standDown ? (
        <Notice tone="caution" title="The bout was stopped" className="mt-3">
          After a knockout or a stop by blows, commissions order weeks without contact, and a ringside
          physician decides. Ask them, and write down what they ordered.
        </Notice>
      ) : null}
    </Panel>
  );
}
