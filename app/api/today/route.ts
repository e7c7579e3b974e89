import { withTeam } from "@/lib/http/with-team";
import { readToday } from "@/lib/services/today/read-today";

// Who has a day of their own: the service answers 404 to everyone else.
export const GET = withTeam((ctx) => readToday(ctx), {});
