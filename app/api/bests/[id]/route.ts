import { withTeam } from "@/lib/http/with-team";
import { dropBest } from "@/lib/services/prescription/bests";

export const DELETE = withTeam(dropBest, { may: "bests.write" });
