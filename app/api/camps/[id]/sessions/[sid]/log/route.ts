import { withCamp } from "@/lib/http/with-team";
import { saveLogSchema } from "@/lib/schemas/today";
import { saveLog } from "@/lib/services/logs/save-log";

export const PUT = withCamp(saveLog, { may: "logs.write", body: saveLogSchema });
