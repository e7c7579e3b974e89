import { csvAnswer } from "@/lib/http/csv-answer";
import { withCamp } from "@/lib/http/with-team";
import { exportReport } from "@/lib/services/report/report-csv";

export const GET = withCamp(async (ctx, input) => csvAnswer(await exportReport(ctx, input)), {
  may: "report.read",
});
