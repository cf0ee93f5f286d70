CREATE TYPE "public"."hold_cause" AS ENUM('person', 'run-rule', 'yield-floor', 'same-reason', 'failed-check');--> statement-breakpoint
CREATE TYPE "public"."mail_state" AS ENUM('waiting', 'trying', 'sent', 'stopped');--> statement-breakpoint
CREATE TYPE "public"."mail_topic" AS ENUM('hold-raised', 'yield-floor', 'expiry', 'shift-report', 'certificate', 'approval-waits', 'trial');--> statement-breakpoint
CREATE TYPE "public"."reason_code_use" AS ENUM('rework', 'scrap', 'concession', 'return', 'hold', 'hold-release');--> statement-breakpoint
CREATE TYPE "public"."delivery_state" AS ENUM('waiting', 'trying', 'delivered', 'stopped');--> statement-breakpoint
CREATE TABLE "api_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"name" text NOT NULL,
	"start" text NOT NULL,
	"token_hash" text NOT NULL,
	"scopes" text[] NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	"revoked_by" uuid,
	"last_used_at" timestamp with time zone,
	CONSTRAINT "api_tokens_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "certificates" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" text NOT NULL,
	"unit_id" uuid,
	"lot_id" uuid NOT NULL,
	"content" jsonb NOT NULL,
	"token_hash" text NOT NULL,
	"storage_key" text NOT NULL,
	"sha256" text NOT NULL,
	"issued_by" uuid NOT NULL,
	"issued_at" timestamp with time zone DEFAULT now() NOT NULL,
	"signature_id" uuid NOT NULL,
	"revoked_at" timestamp with time zone,
	"revoked_by" uuid,
	"revoked_reason" text,
	CONSTRAINT "certificates_number_unique" UNIQUE("number"),
	CONSTRAINT "certificates_tokenHash_unique" UNIQUE("token_hash"),
	CONSTRAINT "certificates_revoked_whole" CHECK (("certificates"."revoked_at" is null) = ("certificates"."revoked_reason" is null))
);
--> statement-breakpoint
CREATE TABLE "chart_baselines" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"quantity" text NOT NULL,
	"lot_id" uuid,
	"board_type_id" uuid NOT NULL,
	"centre" double precision NOT NULL,
	"sigma" double precision NOT NULL,
	"boards" integer NOT NULL,
	"from_lot_ids" uuid[] DEFAULT '{}' NOT NULL,
	"frozen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"frozen_by" uuid,
	CONSTRAINT "chart_baselines_spread" CHECK ("chart_baselines"."sigma" > 0 and "chart_baselines"."boards" > 1)
);
--> statement-breakpoint
CREATE TABLE "hold_rule_sets" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"board_type_id" uuid NOT NULL,
	"rules" jsonb NOT NULL,
	"reason" text NOT NULL,
	"set_by" uuid NOT NULL,
	"set_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "lot_holds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"lot_id" uuid NOT NULL,
	"cause" "hold_cause" NOT NULL,
	"raised_by" uuid,
	"raised_at" timestamp with time zone DEFAULT now() NOT NULL,
	"reason" text NOT NULL,
	"detail" jsonb,
	"run_id" uuid,
	"released_at" timestamp with time zone,
	"released_by" uuid,
	"release_reason" text,
	"signature_id" uuid,
	CONSTRAINT "lot_holds_by_person" CHECK (("lot_holds"."cause" = 'person') = ("lot_holds"."raised_by" is not null)),
	CONSTRAINT "lot_holds_released_signed" CHECK (("lot_holds"."released_at" is null) = ("lot_holds"."signature_id" is null))
);
--> statement-breakpoint
CREATE TABLE "mail_subscriptions" (
	"account_id" uuid NOT NULL,
	"topic" "mail_topic" NOT NULL,
	"since" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mail_subscriptions_account_id_topic_pk" PRIMARY KEY("account_id","topic")
);
--> statement-breakpoint
CREATE TABLE "mails" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"topic" "mail_topic" NOT NULL,
	"cause_key" text NOT NULL,
	"message_id" text NOT NULL,
	"account_id" uuid,
	"to_address" text NOT NULL,
	"subject" text NOT NULL,
	"text" text NOT NULL,
	"attachments" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"state" "mail_state" DEFAULT 'waiting' NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"answer" text,
	"written_at" timestamp with time zone DEFAULT now() NOT NULL,
	"next_try_at" timestamp with time zone,
	"sent_at" timestamp with time zone,
	CONSTRAINT "mails_causeKey_unique" UNIQUE("cause_key"),
	CONSTRAINT "mails_messageId_unique" UNIQUE("message_id")
);
--> statement-breakpoint
CREATE TABLE "reason_codes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"use" "reason_code_use" NOT NULL,
	"word" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retired_at" timestamp with time zone,
	"merged_into_id" uuid,
	CONSTRAINT "reason_codes_use_word_unique" UNIQUE("use","word")
);
--> statement-breakpoint
CREATE TABLE "signatures" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"name" text NOT NULL,
	"signed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"meaning" text NOT NULL,
	"subject" text NOT NULL,
	"subject_id" text NOT NULL,
	"content" jsonb NOT NULL,
	"digest" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "site_settings" (
	"key" text PRIMARY KEY NOT NULL,
	"value" jsonb NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "trail_checkpoints" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"chain" text NOT NULL,
	"place" bigint NOT NULL,
	"seal" text NOT NULL,
	"written_at" timestamp with time zone DEFAULT now() NOT NULL,
	"storage_key" text,
	"stored_at" timestamp with time zone,
	"mailed_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "webhook_deliveries" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"webhook_id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"payload" jsonb NOT NULL,
	"state" "delivery_state" DEFAULT 'waiting' NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"status" integer,
	"problem" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_try_at" timestamp with time zone,
	"next_try_at" timestamp with time zone,
	"delivered_at" timestamp with time zone,
	CONSTRAINT "webhook_deliveries_webhookId_runId_unique" UNIQUE("webhook_id","run_id")
);
--> statement-breakpoint
CREATE TABLE "webhooks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"url" text NOT NULL,
	"sealed_secret" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"paused_at" timestamp with time zone,
	"removed_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "yield_days" (
	"day" date NOT NULL,
	"board_type_id" uuid NOT NULL,
	"lot_id" uuid NOT NULL,
	"station_id" uuid NOT NULL,
	"first_runs" integer DEFAULT 0 NOT NULL,
	"first_passes" integer DEFAULT 0 NOT NULL,
	"later_passes" integer DEFAULT 0 NOT NULL,
	"rejects" integer DEFAULT 0 NOT NULL,
	"no_verdicts" integer DEFAULT 0 NOT NULL,
	"seconds" double precision DEFAULT 0 NOT NULL,
	"reasons" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"trip" jsonb,
	"release" jsonb,
	"hysteresis" jsonb,
	CONSTRAINT "yield_days_lot_id_station_id_day_pk" PRIMARY KEY("lot_id","station_id","day")
);
--> statement-breakpoint
ALTER TABLE "lots" DROP CONSTRAINT "lots_hold";--> statement-breakpoint
ALTER TABLE "dispositions" ADD COLUMN "reason_code_id" uuid;--> statement-breakpoint
ALTER TABLE "dispositions" ADD COLUMN "reason_word" text;--> statement-breakpoint
ALTER TABLE "dispositions" ADD COLUMN "signature_id" uuid;--> statement-breakpoint
ALTER TABLE "dispositions" ADD COLUMN "second_signature_id" uuid;--> statement-breakpoint
ALTER TABLE "trail" ADD COLUMN "chain" text;--> statement-breakpoint
ALTER TABLE "trail" ADD COLUMN "place" bigint;--> statement-breakpoint
ALTER TABLE "trail" ADD COLUMN "seal" text;--> statement-breakpoint
ALTER TABLE "api_tokens" ADD CONSTRAINT "api_tokens_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "api_tokens" ADD CONSTRAINT "api_tokens_revoked_by_accounts_id_fk" FOREIGN KEY ("revoked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "certificates" ADD CONSTRAINT "certificates_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "certificates" ADD CONSTRAINT "certificates_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "certificates" ADD CONSTRAINT "certificates_issued_by_accounts_id_fk" FOREIGN KEY ("issued_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "certificates" ADD CONSTRAINT "certificates_signature_id_signatures_id_fk" FOREIGN KEY ("signature_id") REFERENCES "public"."signatures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "certificates" ADD CONSTRAINT "certificates_revoked_by_accounts_id_fk" FOREIGN KEY ("revoked_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chart_baselines" ADD CONSTRAINT "chart_baselines_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chart_baselines" ADD CONSTRAINT "chart_baselines_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "chart_baselines" ADD CONSTRAINT "chart_baselines_frozen_by_accounts_id_fk" FOREIGN KEY ("frozen_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold_rule_sets" ADD CONSTRAINT "hold_rule_sets_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold_rule_sets" ADD CONSTRAINT "hold_rule_sets_set_by_accounts_id_fk" FOREIGN KEY ("set_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_holds" ADD CONSTRAINT "lot_holds_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_holds" ADD CONSTRAINT "lot_holds_raised_by_accounts_id_fk" FOREIGN KEY ("raised_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_holds" ADD CONSTRAINT "lot_holds_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_holds" ADD CONSTRAINT "lot_holds_released_by_accounts_id_fk" FOREIGN KEY ("released_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_holds" ADD CONSTRAINT "lot_holds_signature_id_signatures_id_fk" FOREIGN KEY ("signature_id") REFERENCES "public"."signatures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_subscriptions" ADD CONSTRAINT "mail_subscriptions_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reason_codes" ADD CONSTRAINT "reason_codes_created_by_accounts_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "site_settings" ADD CONSTRAINT "site_settings_changed_by_accounts_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "webhook_deliveries" ADD CONSTRAINT "webhook_deliveries_webhook_id_webhooks_id_fk" FOREIGN KEY ("webhook_id") REFERENCES "public"."webhooks"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "webhook_deliveries" ADD CONSTRAINT "webhook_deliveries_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "webhooks" ADD CONSTRAINT "webhooks_created_by_accounts_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "yield_days" ADD CONSTRAINT "yield_days_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "yield_days" ADD CONSTRAINT "yield_days_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "yield_days" ADD CONSTRAINT "yield_days_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "api_tokens_account_id_index" ON "api_tokens" USING btree ("account_id");--> statement-breakpoint
CREATE INDEX "certificates_unit_id_index" ON "certificates" USING btree ("unit_id");--> statement-breakpoint
CREATE INDEX "certificates_lot_id_index" ON "certificates" USING btree ("lot_id");--> statement-breakpoint
CREATE INDEX "chart_baselines_board_type_id_quantity_frozen_at_index" ON "chart_baselines" USING btree ("board_type_id","quantity","frozen_at");--> statement-breakpoint
CREATE UNIQUE INDEX "chart_baselines_one_of_itself" ON "chart_baselines" USING btree ("lot_id","quantity") WHERE "chart_baselines"."frozen_by" is null;--> statement-breakpoint
CREATE INDEX "hold_rule_sets_board_type_id_set_at_index" ON "hold_rule_sets" USING btree ("board_type_id","set_at");--> statement-breakpoint
CREATE INDEX "lot_holds_lot_id_raised_at_index" ON "lot_holds" USING btree ("lot_id","raised_at");--> statement-breakpoint
CREATE INDEX "mails_written_at_index" ON "mails" USING btree ("written_at");--> statement-breakpoint
CREATE INDEX "mails_state_index" ON "mails" USING btree ("state");--> statement-breakpoint
CREATE INDEX "signatures_subject_subject_id_index" ON "signatures" USING btree ("subject","subject_id");--> statement-breakpoint
CREATE INDEX "trail_checkpoints_chain_place_index" ON "trail_checkpoints" USING btree ("chain","place");--> statement-breakpoint
CREATE INDEX "webhook_deliveries_webhook_id_created_at_index" ON "webhook_deliveries" USING btree ("webhook_id","created_at");--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_reason_code_id_reason_codes_id_fk" FOREIGN KEY ("reason_code_id") REFERENCES "public"."reason_codes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_signature_id_signatures_id_fk" FOREIGN KEY ("signature_id") REFERENCES "public"."signatures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_second_signature_id_signatures_id_fk" FOREIGN KEY ("second_signature_id") REFERENCES "public"."signatures"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trail" ADD CONSTRAINT "trail_chain_place_unique" UNIQUE("chain","place");--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_hold" CHECK (("lots"."held_by" is null or "lots"."held_at" is not null) and ("lots"."held_at" is null) = ("lots"."hold_reason" is null));