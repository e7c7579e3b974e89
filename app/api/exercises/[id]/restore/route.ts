import { withTeam } from "@/lib/http/with-team";
import { exerciseRestoreSchema } from "@/lib/schemas/exercise";
import { restoreExercise } from "@/lib/services/exercises/save";

export const POST = withTeam(restoreExercise, { may: "exercises.write", body: exerciseRestoreSchema });
