import { withTeam } from "@/lib/http/with-team";
import { exerciseShelveSchema } from "@/lib/schemas/exercise";
import { shelveExercise } from "@/lib/services/exercises/save";

export const POST = withTeam(shelveExercise, { may: "exercises.write", body: exerciseShelveSchema });
