CREATE TYPE "public"."dry_run_state" AS ENUM('waiting', 'running', 'done', 'cancelled', 'failed');--> statement-breakpoint
CREATE TYPE "public"."file_kind" AS ENUM('trimmer-photo', 'fixture-drawing', 'instruction-picture');--> statement-breakpoint
ALTER TYPE "public"."board_type_revision_state" ADD VALUE 'superseded' BEFORE 'withdrawn';--> statement-breakpoint
ALTER TYPE "public"."sequence_revision_state" ADD VALUE 'superseded' BEFORE 'withdrawn';--> statement-breakpoint
CREATE TABLE "draft_editors" (
	"revision_id" uuid NOT NULL,
	"tab_id" text NOT NULL,
	"account_id" uuid NOT NULL,
	"step_id" text,
	"seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "draft_editors_revision_id_tab_id_pk" PRIMARY KEY("revision_id","tab_id")
);
--> statement-breakpoint
CREATE TABLE "dry_runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"draft_version" integer NOT NULL,
	"sequence" jsonb NOT NULL,
	"board_type" jsonb NOT NULL,
	"released_revision_id" uuid,
	"settings" jsonb NOT NULL,
	"state" "dry_run_state" DEFAULT 'waiting' NOT NULL,
	"done" integer DEFAULT 0 NOT NULL,
	"of" integer NOT NULL,
	"result" jsonb,
	"problem" text,
	"kept" boolean DEFAULT false NOT NULL,
	"asked_by" uuid NOT NULL,
	"asked_at" timestamp with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp with time zone,
	"ended_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "engineering_offers" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"station_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"board_type_id" uuid NOT NULL,
	"sequence" jsonb NOT NULL,
	"board_type" jsonb NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"offered_by" uuid NOT NULL,
	"offered_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_by" uuid
);
--> statement-breakpoint
CREATE TABLE "files" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" "file_kind" NOT NULL,
	"storage_key" text NOT NULL,
	"media_type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"width" integer,
	"height" integer,
	"original_name" text NOT NULL,
	"uploaded_by" uuid NOT NULL,
	"uploaded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "files_storageKey_unique" UNIQUE("storage_key")
);
--> statement-breakpoint
CREATE TABLE "lot_moves" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"lot_id" uuid NOT NULL,
	"from_revision_id" uuid NOT NULL,
	"to_revision_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"moved_by" uuid NOT NULL,
	"moved_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "version" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "saved_at" timestamp with time zone DEFAULT now() NOT NULL;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "edited_by" uuid[] DEFAULT '{}' NOT NULL;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "note" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "submitted_by" uuid;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "submitted_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "sent_back_by" uuid;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "sent_back_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "sent_back_reason" text;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD COLUMN "superseded_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "runs" ADD COLUMN "offer_id" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "based_on_id" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "version" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "saved_at" timestamp with time zone DEFAULT now() NOT NULL;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "saved_by" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "edited_by" uuid[] DEFAULT '{}' NOT NULL;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "warning_reasons" jsonb DEFAULT '{}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "submitted_by" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "sent_back_by" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "sent_back_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "sent_back_reason" text;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "release_meaning" text;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "superseded_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "withdrawn_by" uuid;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD COLUMN "withdrawn_reason" text;--> statement-breakpoint
ALTER TABLE "draft_editors" ADD CONSTRAINT "draft_editors_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "draft_editors" ADD CONSTRAINT "draft_editors_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dry_runs" ADD CONSTRAINT "dry_runs_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dry_runs" ADD CONSTRAINT "dry_runs_released_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("released_revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dry_runs" ADD CONSTRAINT "dry_runs_asked_by_accounts_id_fk" FOREIGN KEY ("asked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineering_offers" ADD CONSTRAINT "engineering_offers_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineering_offers" ADD CONSTRAINT "engineering_offers_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineering_offers" ADD CONSTRAINT "engineering_offers_offered_by_accounts_id_fk" FOREIGN KEY ("offered_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineering_offers" ADD CONSTRAINT "engineering_offers_ended_by_accounts_id_fk" FOREIGN KEY ("ended_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_uploaded_by_accounts_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_moves" ADD CONSTRAINT "lot_moves_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_moves" ADD CONSTRAINT "lot_moves_from_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("from_revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_moves" ADD CONSTRAINT "lot_moves_to_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("to_revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_moves" ADD CONSTRAINT "lot_moves_moved_by_accounts_id_fk" FOREIGN KEY ("moved_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "dry_runs_revision_id_asked_at_index" ON "dry_runs" USING btree ("revision_id","asked_at");--> statement-breakpoint
CREATE UNIQUE INDEX "dry_runs_one_at_work" ON "dry_runs" USING btree ("revision_id") WHERE "dry_runs"."state" in ('waiting', 'running');--> statement-breakpoint
CREATE INDEX "engineering_offers_revision_id_index" ON "engineering_offers" USING btree ("revision_id");--> statement-breakpoint
CREATE UNIQUE INDEX "engineering_offers_one_open" ON "engineering_offers" USING btree ("station_id") WHERE "engineering_offers"."ended_at" is null;--> statement-breakpoint
CREATE INDEX "lot_moves_lot_id_moved_at_index" ON "lot_moves" USING btree ("lot_id","moved_at");--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_submitted_by_accounts_id_fk" FOREIGN KEY ("submitted_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_sent_back_by_accounts_id_fk" FOREIGN KEY ("sent_back_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_offer_id_engineering_offers_id_fk" FOREIGN KEY ("offer_id") REFERENCES "public"."engineering_offers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_saved_by_accounts_id_fk" FOREIGN KEY ("saved_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_submitted_by_accounts_id_fk" FOREIGN KEY ("submitted_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_sent_back_by_accounts_id_fk" FOREIGN KEY ("sent_back_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_withdrawn_by_accounts_id_fk" FOREIGN KEY ("withdrawn_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "board_type_revisions_one_draft" ON "board_type_revisions" USING btree ("board_type_id") WHERE "board_type_revisions"."status" in ('draft', 'submitted');--> statement-breakpoint
CREATE UNIQUE INDEX "sequence_revisions_one_draft" ON "sequence_revisions" USING btree ("sequence_id") WHERE "sequence_revisions"."status" in ('draft', 'submitted');--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_not_edited" CHECK ("board_type_revisions"."approved_by" <> all ("board_type_revisions"."edited_by"));--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_engineering_of_offer" CHECK (("runs"."kind" = 'engineering') = ("runs"."offer_id" is not null));--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_not_edited" CHECK ("sequence_revisions"."released_by" <> all ("sequence_revisions"."edited_by"));