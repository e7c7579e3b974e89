import { boolean, index, integer, jsonb, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import type { Exercise } from "../../lib/engine/prescription/exercise";
import { createdAt, id, instant } from "./columns";
import { teams, users } from "./teams";

/** The library that every team starts from; written by the server when its data changed. */
export const libraryExercises = pgTable("library_exercises", {
  id: text().primaryKey(),
  /** Order of the library. */
  position: integer().notNull(),
  exercise: jsonb().$type<Exercise>().notNull(),
});

/** A team's own exercise, or its own form of one of the library (same id). */
export const teamExercises = pgTable(
  "team_exercises",
  {
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    id: text().notNull(),
    exercise: jsonb().$type<Exercise>().notNull(),
    /** Not used in this team: never prescribed, kept for what was logged with it. */
    shelved: boolean().notNull().default(false),
    changedAt: instant().notNull(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.id] })],
);

/** Each edit of a team's exercise, append only. */
export const exerciseEdits = pgTable(
  "exercise_edits",
  {
    id: id(),
    teamId: uuid()
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    exerciseId: text().notNull(),
    /** Null where it was not there before. */
    before: jsonb().$type<{ exercise: Exercise; shelved: boolean }>(),
    /** Null where the team went back to the library's form. */
    after: jsonb().$type<{ exercise: Exercise; shelved: boolean }>(),
    userId: uuid().references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
  },
  (t) => [index("exercise_edits_exercise").on(t.teamId, t.exerciseId, t.createdAt)],
);
