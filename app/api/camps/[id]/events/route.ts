import { withCamp } from "@/lib/http/with-team";
import { campEvents } from "@/lib/services/camps/live";

// A line that stays open is never prepared ahead.
export const dynamic = "force-dynamic";
export const GET = withCamp(campEvents, {});
