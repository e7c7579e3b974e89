import { withTeam } from "@/lib/http/with-team";
import { campFromStartSchema } from "@/lib/schemas/camp";
import { keepStartCamp } from "@/lib/services/camps/from-start";

export const POST = withTeam(keepStartCamp, { may: "camps.create", body: campFromStartSchema, status: 201 });
