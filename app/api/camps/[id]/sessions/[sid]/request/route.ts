import { withCamp } from "@/lib/http/with-team";
import { requestSchema } from "@/lib/schemas/today";
import { askRequest } from "@/lib/services/requests/requests";

export const POST = withCamp(askRequest, { may: "requests.ask", body: requestSchema, status: 201 });
