import { csvAnswer } from "@/lib/http/csv-answer";
import { withTeam } from "@/lib/http/with-team";
import { exportCsv } from "@/lib/services/record/csv";

/** What the file holds decides who may have it: the service asks the table. */
export const GET = withTeam(async (ctx, input) => csvAnswer(await exportCsv(ctx, input)), {});
