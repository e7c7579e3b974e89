import { withTeam } from "@/lib/http/with-team";
import { timetableFormSchema } from "@/lib/schemas/timetable";
import { addToTimetable, readTimetable } from "@/lib/services/timetable/timetable";

export const GET = withTeam(readTimetable, { may: "timetable.read" });
export const POST = withTeam(addToTimetable, {
  may: "timetable.write",
  body: timetableFormSchema,
  status: 201,
});
