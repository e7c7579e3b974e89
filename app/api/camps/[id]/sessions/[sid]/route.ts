import { withCamp } from "@/lib/http/with-team";
import { readSession } from "@/lib/services/prescription/session-page";

export const GET = withCamp(readSession, { may: "camps.read" });
