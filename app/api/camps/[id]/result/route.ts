import { withCamp } from "@/lib/http/with-team";
import { resultFormSchema } from "@/lib/schemas/report";
import { recordResult } from "@/lib/services/report/record-result";

export const PUT = withCamp(recordResult, { may: "result.write", body: resultFormSchema });
