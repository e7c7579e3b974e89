CREATE TYPE "public"."mail_choice" AS ENUM('each', 'daily', 'none');--> statement-breakpoint
CREATE TYPE "public"."role" AS ENUM('head', 'strength', 'skills', 'medic', 'athlete', 'guest');--> statement-breakpoint
CREATE TYPE "public"."units" AS ENUM('kg', 'lb');--> statement-breakpoint
CREATE TYPE "public"."striking_base" AS ENUM('whipping-round-kicks', 'in-and-out-kicks', 'dynamic-high-kicks', 'boxing', 'grappling');--> statement-breakpoint
CREATE TYPE "public"."training_age" AS ENUM('novice', 'intermediate', 'advanced');--> statement-breakpoint
CREATE TYPE "public"."camp_status" AS ENUM('on', 'off');--> statement-breakpoint
CREATE TYPE "public"."item" AS ENUM('strength-a', 'strength-b', 'trunk-and-kick', 'power-touch', 'power-a', 'strength-keep', 'power-b', 'power-short', 'primer');--> statement-breakpoint
CREATE TYPE "public"."session_source" AS ENUM('lift', 'sport', 'bout', 'weigh-in');--> statement-breakpoint
CREATE TYPE "public"."session_status" AS ENUM('confirmed', 'cancelled');--> statement-breakpoint
CREATE TYPE "public"."sport_kind" AS ENUM('hard-sparring', 'technical-sparring', 'skill', 'conditioning', 'travel', 'rest', 'other');--> statement-breakpoint
CREATE TYPE "public"."feed_scope" AS ENUM('athlete', 'team');--> statement-breakpoint
CREATE TYPE "public"."mail_status" AS ENUM('waiting', 'sent', 'failed', 'withheld');--> statement-breakpoint
CREATE TABLE "audit_log" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"user_id" uuid,
	"action" text NOT NULL,
	"subject" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "invites" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"email" text NOT NULL,
	"role" "role" NOT NULL,
	"athlete_id" uuid,
	"token_hash" text NOT NULL,
	"invited_by" uuid,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invites_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"role" "role" NOT NULL,
	"athlete_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_team_user" UNIQUE("team_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "reset_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reset_tokens_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "teams" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"rule_overrides" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"password_hash" text NOT NULL,
	"session_version" integer DEFAULT 1 NOT NULL,
	"units" "units" DEFAULT 'kg' NOT NULL,
	"time_zone" text NOT NULL,
	"mail_choice" "mail_choice" DEFAULT 'each' NOT NULL,
	"current_team_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "athletes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"name" text NOT NULL,
	"date_of_birth" date,
	"sport" text DEFAULT '' NOT NULL,
	"training_age" "training_age" NOT NULL,
	"striking_base" "striking_base" NOT NULL,
	"lifts_per_week" integer NOT NULL,
	"free_hours" jsonb NOT NULL,
	"limitations" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "holds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"from_day" date NOT NULL,
	"to_day" date,
	"reason" text NOT NULL,
	"set_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"lifted_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "camps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"athlete_id" uuid NOT NULL,
	"status" "camp_status" DEFAULT 'on' NOT NULL,
	"home_zone" text NOT NULL,
	"bout_date" date NOT NULL,
	"bout_time" text NOT NULL,
	"bout_zone" text NOT NULL,
	"place" text NOT NULL,
	"opponent" text NOT NULL,
	"ruleset" text NOT NULL,
	"rounds" integer,
	"round_minutes" double precision,
	"limit_kg" double precision,
	"weigh_in_date" date,
	"weigh_in_time" text,
	"weeks" integer NOT NULL,
	"training_age" text NOT NULL,
	"striking_base" text NOT NULL,
	"lifts_per_week" integer NOT NULL,
	"free_hours" jsonb NOT NULL,
	"coach_factors" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"revision" integer DEFAULT 0 NOT NULL,
	"summary" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "pins" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"lift_id" text NOT NULL,
	"item" "item" NOT NULL,
	"week" integer NOT NULL,
	"day" date NOT NULL,
	"start" text NOT NULL,
	CONSTRAINT "pins_camp_id_lift_id_pk" PRIMARY KEY("camp_id","lift_id")
);
--> statement-breakpoint
CREATE TABLE "revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"change" jsonb,
	"edit" jsonb,
	"inverse" jsonb,
	"knock_on" jsonb,
	"lifts_before" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"summary" text NOT NULL,
	"idempotency_key" uuid NOT NULL,
	"user_id" uuid,
	"put_back_of" integer,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "revisions_camp_number" UNIQUE("camp_id","number"),
	CONSTRAINT "revisions_camp_key" UNIQUE("camp_id","idempotency_key")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"id" text NOT NULL,
	"uid" uuid DEFAULT gen_random_uuid() NOT NULL,
	"source" "session_source" NOT NULL,
	"kind" text NOT NULL,
	"title" text NOT NULL,
	"place" text DEFAULT '' NOT NULL,
	"day" date NOT NULL,
	"start" text NOT NULL,
	"minutes" integer NOT NULL,
	"starts_at" timestamp with time zone NOT NULL,
	"ends_at" timestamp with time zone NOT NULL,
	"effort" double precision NOT NULL,
	"pinned" boolean DEFAULT false NOT NULL,
	"lift" jsonb,
	"status" "session_status" DEFAULT 'confirmed' NOT NULL,
	"sequence" integer DEFAULT 0 NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "sessions_camp_id_id_pk" PRIMARY KEY("camp_id","id"),
	CONSTRAINT "sessions_uid_unique" UNIQUE("uid")
);
--> statement-breakpoint
CREATE TABLE "sport_entries" (
	"id" text NOT NULL,
	"team_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"series" text NOT NULL,
	"id_shift" integer DEFAULT 0 NOT NULL,
	"kind" "sport_kind" NOT NULL,
	"title" text NOT NULL,
	"start" text NOT NULL,
	"minutes" integer NOT NULL,
	"effort" double precision NOT NULL,
	"place" text NOT NULL,
	"rrule" text,
	"exdate" jsonb DEFAULT '[]'::jsonb NOT NULL,
	CONSTRAINT "sport_entries_camp_id_id_pk" PRIMARY KEY("camp_id","id")
);
--> statement-breakpoint
CREATE TABLE "timetable_entries" (
	"id" text NOT NULL,
	"team_id" uuid NOT NULL,
	"series" text NOT NULL,
	"id_shift" integer DEFAULT 0 NOT NULL,
	"kind" "sport_kind" NOT NULL,
	"title" text NOT NULL,
	"start" text NOT NULL,
	"minutes" integer NOT NULL,
	"effort" double precision NOT NULL,
	"place" text NOT NULL,
	"rrule" text,
	"exdate" jsonb DEFAULT '[]'::jsonb NOT NULL,
	CONSTRAINT "timetable_entries_team_id_id_pk" PRIMARY KEY("team_id","id")
);
--> statement-breakpoint
CREATE TABLE "feeds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"scope" "feed_scope" NOT NULL,
	"athlete_id" uuid,
	"discreet" boolean DEFAULT false NOT NULL,
	"token_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"revoked_at" timestamp with time zone,
	"last_read_at" timestamp with time zone,
	CONSTRAINT "feeds_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "mails" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid,
	"user_id" uuid,
	"recipient" text NOT NULL,
	"kind" text NOT NULL,
	"key" text NOT NULL,
	"message_id" text NOT NULL,
	"subject" text NOT NULL,
	"text" text NOT NULL,
	"html" text NOT NULL,
	"headers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"status" "mail_status" DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp with time zone,
	CONSTRAINT "mails_key_unique" UNIQUE("key"),
	CONSTRAINT "mails_messageId_unique" UNIQUE("message_id")
);
--> statement-breakpoint
CREATE TABLE "notices" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"team_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"camp_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"mail_id" uuid,
	CONSTRAINT "notices_once" UNIQUE("user_id","camp_id","revision")
);
--> statement-breakpoint
ALTER TABLE "audit_log" ADD CONSTRAINT "audit_log_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_log" ADD CONSTRAINT "audit_log_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invites" ADD CONSTRAINT "invites_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invites" ADD CONSTRAINT "invites_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invites" ADD CONSTRAINT "invites_invited_by_users_id_fk" FOREIGN KEY ("invited_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reset_tokens" ADD CONSTRAINT "reset_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "athletes" ADD CONSTRAINT "athletes_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "holds" ADD CONSTRAINT "holds_set_by_users_id_fk" FOREIGN KEY ("set_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "camps" ADD CONSTRAINT "camps_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "camps" ADD CONSTRAINT "camps_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pins" ADD CONSTRAINT "pins_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pins" ADD CONSTRAINT "pins_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sport_entries" ADD CONSTRAINT "sport_entries_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sport_entries" ADD CONSTRAINT "sport_entries_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "timetable_entries" ADD CONSTRAINT "timetable_entries_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "feeds" ADD CONSTRAINT "feeds_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "feeds" ADD CONSTRAINT "feeds_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "feeds" ADD CONSTRAINT "feeds_athlete_id_athletes_id_fk" FOREIGN KEY ("athlete_id") REFERENCES "public"."athletes"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_camp_id_camps_id_fk" FOREIGN KEY ("camp_id") REFERENCES "public"."camps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_mail_id_mails_id_fk" FOREIGN KEY ("mail_id") REFERENCES "public"."mails"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_log_team_time" ON "audit_log" USING btree ("team_id","created_at");--> statement-breakpoint
CREATE INDEX "invites_team" ON "invites" USING btree ("team_id");--> statement-breakpoint
CREATE INDEX "memberships_user" ON "memberships" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "reset_tokens_user" ON "reset_tokens" USING btree ("user_id");--> statement-breakpoint
CREATE UNIQUE INDEX "users_email_lower" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "athletes_team" ON "athletes" USING btree ("team_id");--> statement-breakpoint
CREATE INDEX "holds_athlete" ON "holds" USING btree ("team_id","athlete_id");--> statement-breakpoint
CREATE INDEX "camps_team_bout" ON "camps" USING btree ("team_id","bout_date");--> statement-breakpoint
CREATE INDEX "camps_athlete" ON "camps" USING btree ("athlete_id");--> statement-breakpoint
CREATE INDEX "sessions_camp_day" ON "sessions" USING btree ("camp_id","day");--> statement-breakpoint
CREATE INDEX "sessions_team_time" ON "sessions" USING btree ("team_id","starts_at");--> statement-breakpoint
CREATE INDEX "feeds_user" ON "feeds" USING btree ("team_id","user_id");--> statement-breakpoint
CREATE INDEX "mails_user" ON "mails" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "mails_status" ON "mails" USING btree ("status");--> statement-breakpoint
CREATE INDEX "notices_waiting" ON "notices" USING btree ("user_id","mail_id");