import { withTeam } from "@/lib/http/with-team";
import { timetableFormSchema } from "@/lib/schemas/timetable";
import { dropFromTimetable, editTimetable } from "@/lib/services/timetable/timetable";

export const PUT = withTeam(editTimetable, { may: "timetable.write", body: timetableFormSchema });
export const DELETE = withTeam(dropFromTimetable, { may: "timetable.write" });
