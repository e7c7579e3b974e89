import { withTeam } from "@/lib/http/with-team";
import { holdFormSchema } from "@/lib/schemas/athlete";
import { setHold } from "@/lib/services/holds/holds";

export const POST = withTeam(setHold, { may: "holds.write", body: holdFormSchema, status: 201 });
