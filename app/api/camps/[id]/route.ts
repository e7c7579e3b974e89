import { withCamp } from "@/lib/http/with-team";
import { readCamp } from "@/lib/services/camps/read";

export const GET = withCamp(readCamp, {});
