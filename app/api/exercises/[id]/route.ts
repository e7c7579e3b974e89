import { withTeam } from "@/lib/http/with-team";
import { exerciseEditSchema } from "@/lib/schemas/exercise";
import { readExercise } from "@/lib/services/exercises/read";
import { editExercise } from "@/lib/services/exercises/save";

export const GET = withTeam(readExercise, { may: "exercises.read" });
export const PUT = withTeam(editExercise, { may: "exercises.write", body: exerciseEditSchema });
