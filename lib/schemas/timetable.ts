import type { z } from "zod";
import { sportEntrySchema } from "./camp-book";

/** One line of the gym's week: a session that comes again, or a single one. New camps take their sport from here. */
export const timetableFormSchema = sportEntrySchema.omit({ id: true, series: true, idShift: true });
export type TimetableForm = z.infer<typeof timetableFormSchema>;

export type TimetableEntry = TimetableForm & { readonly id: string };
