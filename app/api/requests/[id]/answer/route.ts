import { withTeam } from "@/lib/http/with-team";
import { requestAnswerSchema } from "@/lib/schemas/today";
import { answerRequest } from "@/lib/services/requests/requests";

export const POST = withTeam(answerRequest, { may: "requests.answer", body: requestAnswerSchema });
