import { withCamp } from "@/lib/http/with-team";
import { readReport } from "@/lib/services/report/read-report";

export const GET = withCamp(readReport, { may: "report.read" });
