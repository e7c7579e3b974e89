import { csvText, type CsvCell } from "@/lib/format/csv";
import { fromKg } from "@/lib/format/load";
import type { ReportView } from "@/lib/schemas/report";
import type { TeamContext } from "@/lib/services/context";
import { readReport } from "./read-report";

type Row = readonly CsvCell[];

/** One table of lines "part, what, when, planned, done, words": a file that a spreadsheet sorts and filters. */
function rowsOf(report: ReportView): Row[] {
  const { unit } = report;
  const weight = report.weight && "points" in report.weight ? report.weight.points : [];
  return [
    ["Bout", report.result?.result ?? null, report.bout.date, null, null, report.result?.how ?? ""],
    ...(report.attendance ?? []).map(({ title, planned, done, missed, unanswered }): Row => [
      "Sessions",
      title,
      null,
      planned,
      done,
      `${missed} missed, ${unanswered} without an answer`,
    ]),
    ...(report.byWeek ?? []).flatMap(({ weeksOut, from, phase, ...week }): Row[] => [
      ["Sets", `${weeksOut} weeks out`, from, week.setsPlanned, week.setsDone, phase],
      ["Load AU", `${weeksOut} weeks out`, from, week.loadPlanned, week.loadDone, phase],
    ]),
    ...(report.tests ?? []).map(({ title, verdict }): Row => [
      "Test",
      title,
      verdict.last,
      null,
      verdict.change,
      verdict.sentence,
    ]),
    ...weight.map(({ date, kg }): Row => [`Weight ${unit}`, null, date, null, fromKg(kg, unit), ""]),
    ...(report.changes ?? []).map(({ number, at, by, summary }): Row => [
      "Change",
      number,
      at,
      null,
      null,
      `${by}: ${summary}`,
    ]),
  ];
}

/** The report as a CSV file. */
export async function exportReport(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<{ readonly name: string; readonly text: string }> {
  const report = await readReport(ctx, { params });
  const head = ["Part", "What", "When", "Planned", "Done", "In words"];
  return { name: `${report.athlete.name} camp ${report.bout.date}`, text: csvText(head, rowsOf(report)) };
}
