CREATE TYPE "public"."decision" AS ENUM('accepted', 'dismissed');--> statement-breakpoint
CREATE TYPE "public"."log_state" AS ENUM('open', 'done', 'missed');--> statement-breakpoint
CREATE TYPE "public"."request_state" AS ENUM('asked', 'accepted', 'declined', 'withdrawn');--> statement-breakpoint
CREATE TYPE "public"."side" AS ENUM('both', 'left', 'right');--> statement-breakpoint
CREATE TABLE "limitation_history" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"limitations" text NOT NULL,
	"limitation_codes" jsonb NOT NULL,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "exercise_edits" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"exercise_id" text NOT NULL,
	"before" jsonb,
	"after" jsonb,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "library_exercises" (
	"id" text PRIMARY KEY NOT NULL,
	"position" integer NOT NULL,
	"exercise" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "team_exercises" (
	"team_id" uuid NOT NULL,
	"id" text NOT NULL,
	"exercise" jsonb NOT NULL,
	"shelved" boolean DEFAULT false NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "team_exercises_team_id_id_pk" PRIMARY KEY("team_id","id")
);
--> statement-breakpoint
CREATE TABLE "bests" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"exercise_id" text NOT NULL,
	"day" date NOT NULL,
	"lifted_kg" double precision NOT NULL,
	"reps" integer NOT NULL,
	"formula" text,
	"kg" double precision NOT NULL,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"removed_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "lift_edits" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"lift_id" text NOT NULL,
	"edit" jsonb NOT NULL,
	"user_id" uuid,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "lift_edits_camp_id_lift_id_pk" PRIMARY KEY("camp_id","lift_id")
);
--> statement-breakpoint
CREATE TABLE "swaps" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"item" "item" NOT NULL,
	"from_exercise" text NOT NULL,
	"to_exercise" text NOT NULL,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "swaps_camp_id_item_from_exercise_pk" PRIMARY KEY("camp_id","item","from_exercise")
);
--> statement-breakpoint
CREATE TABLE "check_ins" (
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"day" date NOT NULL,
	"sleep" smallint NOT NULL,
	"fatigue" smallint NOT NULL,
	"soreness" smallint NOT NULL,
	"stress" smallint NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "check_ins_athlete_id_day_pk" PRIMARY KEY("athlete_id","day")
);
--> statement-breakpoint
CREATE TABLE "logged_sets" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"session_id" text NOT NULL,
	"slot" text NOT NULL,
	"number" smallint NOT NULL,
	"exercise_id" text NOT NULL,
	"day" date NOT NULL,
	"kg" double precision,
	"reps" smallint NOT NULL,
	"reserve" smallint,
	CONSTRAINT "logged_sets_camp_id_session_id_slot_number_pk" PRIMARY KEY("camp_id","session_id","slot","number")
);
--> statement-breakpoint
CREATE TABLE "requests" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"session_id" text NOT NULL,
	"reason" text NOT NULL,
	"state" "request_state" DEFAULT 'asked' NOT NULL,
	"answer" text DEFAULT '' NOT NULL,
	"answered_by" uuid,
	"answered_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "session_logs" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"session_id" text NOT NULL,
	"day" date NOT NULL,
	"state" "log_state" NOT NULL,
	"effort" double precision,
	"minutes" integer,
	"hard_rounds" integer,
	"knock" boolean DEFAULT false NOT NULL,
	"pain_place" text DEFAULT '' NOT NULL,
	"pain" smallint,
	"note" text DEFAULT '' NOT NULL,
	"prescribed" jsonb,
	"version" integer DEFAULT 1 NOT NULL,
	"keys" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"logged_at" timestamp with time zone NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "session_logs_camp_id_session_id_pk" PRIMARY KEY("camp_id","session_id")
);
--> statement-breakpoint
CREATE TABLE "suggestion_decisions" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"key" text NOT NULL,
	"decision" "decision" NOT NULL,
	"title" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"revision" integer,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "suggestion_decisions_camp_id_key_pk" PRIMARY KEY("camp_id","key")
);
--> statement-breakpoint
CREATE TABLE "weights" (
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"day" date NOT NULL,
	"kg" double precision NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "weights_athlete_id_day_pk" PRIMARY KEY("athlete_id","day")
);
--> statement-breakpoint
CREATE TABLE "test_trials" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"day" date NOT NULL,
	"kind" text NOT NULL,
	"side" "side" DEFAULT 'both' NOT NULL,
	"value" double precision NOT NULL,
	"second" double precision,
	"mass_kg" double precision,
	"note" text DEFAULT '' NOT NULL,
	"upload_id" uuid,
	"user_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"removed_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "second_base" "striking_base";--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "second_share" double precision;--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "limitation_codes" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "equipment" jsonb DEFAULT '["barbell","rack","trap-bar","dumbbell","kettlebell","plate","cable","band","medicine-ball","pull-up-bar","bench","extension-bench","box","landmine","sled","rope","neck-harness","heavy-bag"]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "plate_unit" "units" DEFAULT 'kg' NOT NULL;--> statement-breakpoint
ALTER TABLE "athletes" ADD COLUMN "plate_step" double precision DEFAULT 2.5 NOT NULL;--> statement-breakpoint
ALTER TABLE "camps" ADD COLUMN "responses" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "camps" ADD COLUMN "result" jsonb;--> statement-breakpoint
ALTER TABLE "limitation_history" ADD CONSTRAINT "limitation_history_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "limitation_history" ADD CONSTRAINT "limitation_history_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "limitation_history" ADD CONSTRAINT "limitation_history_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "exercise_edits" ADD CONSTRAINT "exercise_edits_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "exercise_edits" ADD CONSTRAINT "exercise_edits_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "team_exercises" ADD CONSTRAINT "team_exercises_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bests" ADD CONSTRAINT "bests_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bests" ADD CONSTRAINT "bests_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bests" ADD CONSTRAINT "bests_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lift_edits" ADD CONSTRAINT "lift_edits_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lift_edits" ADD CONSTRAINT "lift_edits_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lift_edits" ADD CONSTRAINT "lift_edits_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "swaps" ADD CONSTRAINT "swaps_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "swaps" ADD CONSTRAINT "swaps_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "swaps" ADD CONSTRAINT "swaps_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_ins" ADD CONSTRAINT "check_ins_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "check_ins" ADD CONSTRAINT "check_ins_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_sets" ADD CONSTRAINT "logged_sets_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_sets" ADD CONSTRAINT "logged_sets_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "logged_sets" ADD CONSTRAINT "logged_sets_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "requests" ADD CONSTRAINT "requests_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "requests" ADD CONSTRAINT "requests_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "requests" ADD CONSTRAINT "requests_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "requests" ADD CONSTRAINT "requests_answered_by_users_id_fk" FOREIGN KEY ("answered_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session_logs" ADD CONSTRAINT "session_logs_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session_logs" ADD CONSTRAINT "session_logs_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session_logs" ADD CONSTRAINT "session_logs_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suggestion_decisions" ADD CONSTRAINT "suggestion_decisions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suggestion_decisions" ADD CONSTRAINT "suggestion_decisions_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "suggestion_decisions" ADD CONSTRAINT "suggestion_decisions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "weights" ADD CONSTRAINT "weights_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "weights" ADD CONSTRAINT "weights_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_trials" ADD CONSTRAINT "test_trials_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_trials" ADD CONSTRAINT "test_trials_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_trials" ADD CONSTRAINT "test_trials_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "limitation_history_athlete" ON "limitation_history" USING btree ("team_id","athlete_id","created_at");--> statement-breakpoint
CREATE INDEX "exercise_edits_exercise" ON "exercise_edits" USING btree ("team_id","exercise_id","created_at");--> statement-breakpoint
CREATE INDEX "bests_athlete" ON "bests" USING btree ("team_id","athlete_id","day");--> statement-breakpoint
CREATE INDEX "check_ins_team_day" ON "check_ins" USING btree ("team_id","day");--> statement-breakpoint
CREATE INDEX "logged_sets_exercise" ON "logged_sets" USING btree ("athlete_id","exercise_id","day");--> statement-breakpoint
CREATE INDEX "requests_team_state" ON "requests" USING btree ("team_id","state");--> statement-breakpoint
CREATE INDEX "requests_camp" ON "requests" USING btree ("camp_id");--> statement-breakpoint
CREATE INDEX "session_logs_athlete_day" ON "session_logs" USING btree ("team_id","athlete_id","day");--> statement-breakpoint
CREATE INDEX "session_logs_team_day" ON "session_logs" USING btree ("team_id","day");--> statement-breakpoint
CREATE INDEX "weights_team_day" ON "weights" USING btree ("team_id","day");--> statement-breakpoint
CREATE INDEX "test_trials_athlete" ON "test_trials" USING btree ("team_id","athlete_id","kind","day");