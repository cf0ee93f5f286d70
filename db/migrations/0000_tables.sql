CREATE TYPE "public"."account_link_kind" AS ENUM('first-administrator', 'choose-password');--> statement-breakpoint
CREATE TYPE "public"."role" AS ENUM('operator', 'test-engineer', 'quality-manager', 'administrator');--> statement-breakpoint
CREATE TYPE "public"."board_type_revision_state" AS ENUM('draft', 'submitted', 'approved', 'withdrawn');--> statement-breakpoint
CREATE TYPE "public"."disposition_kind" AS ENUM('rework', 'scrap', 'concession', 'return');--> statement-breakpoint
CREATE TYPE "public"."instrument_kind" AS ENUM('supply', 'multimeter', 'fixture-controller');--> statement-breakpoint
CREATE TYPE "public"."label_state" AS ENUM('waiting', 'printed', 'failed');--> statement-breakpoint
CREATE TYPE "public"."lot_state" AS ENUM('open', 'paused', 'closed');--> statement-breakpoint
CREATE TYPE "public"."run_closer" AS ENUM('station', 'recovery', 'journal');--> statement-breakpoint
CREATE TYPE "public"."run_kind" AS ENUM('production', 'engineering', 'daily-check', 'commissioning');--> statement-breakpoint
CREATE TYPE "public"."supply_off_witness" AS ENUM('meter', 'supply');--> statement-breakpoint
CREATE TYPE "public"."verdict" AS ENUM('pass', 'reject', 'no-verdict');--> statement-breakpoint
CREATE TYPE "public"."sequence_revision_state" AS ENUM('draft', 'submitted', 'released', 'withdrawn');--> statement-breakpoint
CREATE TYPE "public"."session_kind" AS ENUM('desk', 'bench');--> statement-breakpoint
CREATE TYPE "public"."attempt_outcome" AS ENUM('succeeded', 'failed', 'not-evaluated');--> statement-breakpoint
CREATE TYPE "public"."station_scheme" AS ENUM('day', 'night', 'system');--> statement-breakpoint
CREATE TABLE "account_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" "account_link_kind" NOT NULL,
	"token_hash" text NOT NULL,
	"account_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "account_links_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "accounts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text,
	"operator_number" text,
	"badge_code" text,
	"password_hash" text,
	"pin_hash" text,
	"roles" "role"[] NOT NULL,
	"locale" text DEFAULT 'en' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"disabled_at" timestamp with time zone,
	CONSTRAINT "accounts_email_unique" UNIQUE("email"),
	CONSTRAINT "accounts_operatorNumber_unique" UNIQUE("operator_number"),
	CONSTRAINT "accounts_badgeCode_unique" UNIQUE("badge_code"),
	CONSTRAINT "accounts_email_lower" CHECK ("accounts"."email" = lower("accounts"."email"))
);
--> statement-breakpoint
CREATE TABLE "board_type_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"board_type_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"specification" jsonb NOT NULL,
	"status" "board_type_revision_state" DEFAULT 'draft' NOT NULL,
	"made_by" uuid NOT NULL,
	"made_at" timestamp with time zone DEFAULT now() NOT NULL,
	"approved_by" uuid,
	"approved_at" timestamp with time zone,
	CONSTRAINT "board_type_revisions_boardTypeId_number_unique" UNIQUE("board_type_id","number"),
	CONSTRAINT "board_type_revisions_not_own" CHECK ("board_type_revisions"."approved_by" <> "board_type_revisions"."made_by"),
	CONSTRAINT "board_type_revisions_approved" CHECK ("board_type_revisions"."status" <> 'approved' or "board_type_revisions"."approved_by" is not null)
);
--> statement-breakpoint
CREATE TABLE "board_types" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "board_types_code_unique" UNIQUE("code")
);
--> statement-breakpoint
CREATE TABLE "calibrations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"instrument_id" uuid NOT NULL,
	"calibrated_on" date NOT NULL,
	"due_on" date NOT NULL,
	"certificate_number" text NOT NULL,
	"entered_by" uuid NOT NULL,
	"entered_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "calibrations_due_after" CHECK ("calibrations"."due_on" > "calibrations"."calibrated_on")
);
--> statement-breakpoint
CREATE TABLE "commissionings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"station_id" uuid NOT NULL,
	"reference_board_id" uuid NOT NULL,
	"overshoot" double precision NOT NULL,
	"settle_ms" double precision NOT NULL,
	"waypoint_ms" double precision NOT NULL,
	"noise_volts" double precision NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"valid_until" timestamp with time zone NOT NULL,
	"by_account_id" uuid NOT NULL
);
--> statement-breakpoint
CREATE TABLE "daily_checks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"station_id" uuid NOT NULL,
	"reference_board_id" uuid NOT NULL,
	"run_id" uuid,
	"trip_volts" double precision,
	"release_volts" double precision,
	"passed" boolean NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"valid_hours" double precision NOT NULL,
	"by_account_id" uuid NOT NULL
);
--> statement-breakpoint
CREATE TABLE "dispositions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"unit_id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"kind" "disposition_kind" NOT NULL,
	"action" text DEFAULT '' NOT NULL,
	"reason" text NOT NULL,
	"signed_by" uuid NOT NULL,
	"signed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"second_signed_by" uuid,
	"second_signed_at" timestamp with time zone,
	CONSTRAINT "dispositions_two_people" CHECK ("dispositions"."second_signed_by" <> "dispositions"."signed_by"),
	CONSTRAINT "dispositions_rework_says_what" CHECK ("dispositions"."kind" <> 'rework' or length("dispositions"."action") > 0)
);
--> statement-breakpoint
CREATE TABLE "engineer_calls" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"station_id" uuid NOT NULL,
	"run_id" uuid,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"by_account_id" uuid,
	"acknowledged_by" uuid,
	"acknowledged_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "instruments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"kind" "instrument_kind" NOT NULL,
	"station_id" uuid,
	"expected_identity" text,
	"command_set" text DEFAULT 'scpi-1999' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retired_at" timestamp with time zone,
	CONSTRAINT "instruments_code_unique" UNIQUE("code")
);
--> statement-breakpoint
CREATE TABLE "labels" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"unit_id" uuid NOT NULL,
	"run_id" uuid NOT NULL,
	"printer_id" uuid,
	"state" "label_state" DEFAULT 'waiting' NOT NULL,
	"problem" text,
	"tries" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"printed_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "lot_components" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"lot_id" uuid NOT NULL,
	"component" text NOT NULL,
	"batch" text NOT NULL,
	"from_at" timestamp with time zone DEFAULT now() NOT NULL,
	"by_account_id" uuid NOT NULL,
	"station_id" uuid
);
--> statement-breakpoint
CREATE TABLE "lots" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"board_type_revision_id" uuid NOT NULL,
	"sequence_revision_id" uuid NOT NULL,
	"size" integer NOT NULL,
	"state" "lot_state" DEFAULT 'open' NOT NULL,
	"held_at" timestamp with time zone,
	"held_by" uuid,
	"hold_reason" text,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"closed_at" timestamp with time zone,
	CONSTRAINT "lots_code_unique" UNIQUE("code"),
	CONSTRAINT "lots_size" CHECK ("lots"."size" > 0),
	CONSTRAINT "lots_hold" CHECK (("lots"."held_at" is null) = ("lots"."held_by" is null) and ("lots"."held_at" is null) = ("lots"."hold_reason" is null))
);
--> statement-breakpoint
CREATE TABLE "measurements" (
	"run_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"quantity" text NOT NULL,
	"phase" text NOT NULL,
	"value" double precision NOT NULL,
	"standard_uncertainty" double precision,
	"min" double precision,
	"max" double precision,
	"guarded_min" double precision,
	"guarded_max" double precision,
	"passed" boolean,
	"step_index" integer NOT NULL,
	"settles" integer,
	CONSTRAINT "measurements_run_id_n_pk" PRIMARY KEY("run_id","n")
);
--> statement-breakpoint
CREATE TABLE "printers" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"uri" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retired_at" timestamp with time zone,
	CONSTRAINT "printers_name_unique" UNIQUE("name")
);
--> statement-breakpoint
CREATE TABLE "reference_boards" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"board_type_id" uuid NOT NULL,
	"trip_volts" double precision NOT NULL,
	"release_volts" double precision NOT NULL,
	"tolerance_volts" double precision NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retired_at" timestamp with time zone,
	CONSTRAINT "reference_boards_code_unique" UNIQUE("code")
);
--> statement-breakpoint
CREATE TABLE "retest_orders" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"unit_id" uuid NOT NULL,
	"reason" text NOT NULL,
	"signed_by" uuid NOT NULL,
	"signed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"used_by_run_id" uuid,
	CONSTRAINT "retest_orders_usedByRunId_unique" UNIQUE("used_by_run_id")
);
--> statement-breakpoint
CREATE TABLE "run_events" (
	"run_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"batch" jsonb NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "run_events_run_id_n_pk" PRIMARY KEY("run_id","n")
);
--> statement-breakpoint
CREATE TABLE "runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" "run_kind" NOT NULL,
	"unit_id" uuid,
	"lot_id" uuid,
	"reference_board_id" uuid,
	"station_id" uuid NOT NULL,
	"operator_id" uuid NOT NULL,
	"attempt" integer NOT NULL,
	"plan" jsonb NOT NULL,
	"started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	"verdict" "verdict",
	"reject_reason" text,
	"likely_cause" text,
	"no_verdict_reason" text,
	"fault_code" text,
	"fault_detail" text,
	"failing_when_stopped" boolean DEFAULT false NOT NULL,
	"supply_off_confirmed" boolean,
	"supply_off_volts" double precision,
	"supply_off_by" "supply_off_witness",
	"seconds" double precision,
	"trim_rounds" integer,
	"turns_advised" double precision,
	"bin_code" text,
	"bin_scanned_at" timestamp with time zone,
	"closed_by" "run_closer",
	CONSTRAINT "runs_of_something" CHECK (("runs"."unit_id" is null) = ("runs"."lot_id" is null) and ("runs"."kind" <> 'production' or "runs"."unit_id" is not null)),
	CONSTRAINT "runs_closed_whole" CHECK (("runs"."ended_at" is null) = ("runs"."verdict" is null) and ("runs"."ended_at" is null) = ("runs"."closed_by" is null)),
	CONSTRAINT "runs_reject_has_reason" CHECK (("runs"."verdict" is not distinct from 'reject') = ("runs"."reject_reason" is not null)),
	CONSTRAINT "runs_no_verdict_has_reason" CHECK (("runs"."verdict" is not distinct from 'no-verdict') = ("runs"."no_verdict_reason" is not null)),
	CONSTRAINT "runs_bin_scan_whole" CHECK (("runs"."bin_code" is null) = ("runs"."bin_scanned_at" is null))
);
--> statement-breakpoint
CREATE TABLE "sequence_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sequence_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"data" jsonb NOT NULL,
	"status" "sequence_revision_state" DEFAULT 'draft' NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"made_by" uuid NOT NULL,
	"made_at" timestamp with time zone DEFAULT now() NOT NULL,
	"submitted_at" timestamp with time zone,
	"released_by" uuid,
	"released_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	CONSTRAINT "sequence_revisions_sequenceId_number_unique" UNIQUE("sequence_id","number"),
	CONSTRAINT "sequence_revisions_not_own" CHECK ("sequence_revisions"."released_by" <> "sequence_revisions"."made_by"),
	CONSTRAINT "sequence_revisions_released" CHECK ("sequence_revisions"."status" <> 'released' or "sequence_revisions"."released_by" is not null)
);
--> statement-breakpoint
CREATE TABLE "sequences" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"board_type_id" uuid NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sequences_boardTypeId_name_unique" UNIQUE("board_type_id","name")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"kind" "session_kind" NOT NULL,
	"station_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_because" text,
	CONSTRAINT "sessions_bench_has_station" CHECK (("sessions"."kind" = 'bench') = ("sessions"."station_id" is not null))
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"identifier" text NOT NULL,
	"station_id" uuid,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"outcome" "attempt_outcome" NOT NULL
);
--> statement-breakpoint
CREATE TABLE "simulated_boards" (
	"serial" text PRIMARY KEY NOT NULL,
	"seed" integer NOT NULL,
	"defect" text DEFAULT 'none' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "station_enrolments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"station_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"enrolled_by" uuid NOT NULL,
	"enrolled_at" timestamp with time zone DEFAULT now() NOT NULL,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "station_enrolments_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "stations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"fixture" text NOT NULL,
	"scheme" "station_scheme" DEFAULT 'system' NOT NULL,
	"link" jsonb NOT NULL,
	"has_wiper_probe" boolean DEFAULT false NOT NULL,
	"bin_code" text NOT NULL,
	"printer_id" uuid,
	"mains_hz" smallint DEFAULT 50 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retired_at" timestamp with time zone,
	CONSTRAINT "stations_code_unique" UNIQUE("code"),
	CONSTRAINT "stations_binCode_unique" UNIQUE("bin_code"),
	CONSTRAINT "stations_mains" CHECK ("stations"."mains_hz" in (50, 60))
);
--> statement-breakpoint
CREATE TABLE "traces" (
	"run_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"kind" text NOT NULL,
	"at_ms" real[] NOT NULL,
	"volts" real[] NOT NULL,
	"output" smallint[] NOT NULL,
	CONSTRAINT "traces_run_id_n_pk" PRIMARY KEY("run_id","n"),
	CONSTRAINT "traces_equal_lengths" CHECK (cardinality("traces"."at_ms") = cardinality("traces"."volts") and cardinality("traces"."volts") = cardinality("traces"."output"))
);
--> statement-breakpoint
CREATE TABLE "trail" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "trail_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"account_id" uuid,
	"station_id" uuid,
	"action" text NOT NULL,
	"entity" text NOT NULL,
	"entity_id" text NOT NULL,
	"before" jsonb,
	"after" jsonb,
	"reason" text
);
--> statement-breakpoint
CREATE TABLE "trainings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"account_id" uuid NOT NULL,
	"board_type_id" uuid NOT NULL,
	"valid_until" timestamp with time zone NOT NULL,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "units" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"serial" text NOT NULL,
	"lot_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"scrapped_at" timestamp with time zone,
	CONSTRAINT "units_serial_unique" UNIQUE("serial"),
	CONSTRAINT "units_lotId_position_unique" UNIQUE("lot_id","position")
);
--> statement-breakpoint
ALTER TABLE "account_links" ADD CONSTRAINT "account_links_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_made_by_accounts_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "board_type_revisions" ADD CONSTRAINT "board_type_revisions_approved_by_accounts_id_fk" FOREIGN KEY ("approved_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_instrument_id_instruments_id_fk" FOREIGN KEY ("instrument_id") REFERENCES "public"."instruments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_entered_by_accounts_id_fk" FOREIGN KEY ("entered_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "commissionings" ADD CONSTRAINT "commissionings_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "commissionings" ADD CONSTRAINT "commissionings_reference_board_id_reference_boards_id_fk" FOREIGN KEY ("reference_board_id") REFERENCES "public"."reference_boards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "commissionings" ADD CONSTRAINT "commissionings_by_account_id_accounts_id_fk" FOREIGN KEY ("by_account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "daily_checks" ADD CONSTRAINT "daily_checks_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "daily_checks" ADD CONSTRAINT "daily_checks_reference_board_id_reference_boards_id_fk" FOREIGN KEY ("reference_board_id") REFERENCES "public"."reference_boards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "daily_checks" ADD CONSTRAINT "daily_checks_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "daily_checks" ADD CONSTRAINT "daily_checks_by_account_id_accounts_id_fk" FOREIGN KEY ("by_account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_signed_by_accounts_id_fk" FOREIGN KEY ("signed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispositions" ADD CONSTRAINT "dispositions_second_signed_by_accounts_id_fk" FOREIGN KEY ("second_signed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineer_calls" ADD CONSTRAINT "engineer_calls_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineer_calls" ADD CONSTRAINT "engineer_calls_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineer_calls" ADD CONSTRAINT "engineer_calls_by_account_id_accounts_id_fk" FOREIGN KEY ("by_account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "engineer_calls" ADD CONSTRAINT "engineer_calls_acknowledged_by_accounts_id_fk" FOREIGN KEY ("acknowledged_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "instruments" ADD CONSTRAINT "instruments_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "labels" ADD CONSTRAINT "labels_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "labels" ADD CONSTRAINT "labels_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "labels" ADD CONSTRAINT "labels_printer_id_printers_id_fk" FOREIGN KEY ("printer_id") REFERENCES "public"."printers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_components" ADD CONSTRAINT "lot_components_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_components" ADD CONSTRAINT "lot_components_by_account_id_accounts_id_fk" FOREIGN KEY ("by_account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lot_components" ADD CONSTRAINT "lot_components_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_board_type_revision_id_board_type_revisions_id_fk" FOREIGN KEY ("board_type_revision_id") REFERENCES "public"."board_type_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_sequence_revision_id_sequence_revisions_id_fk" FOREIGN KEY ("sequence_revision_id") REFERENCES "public"."sequence_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_held_by_accounts_id_fk" FOREIGN KEY ("held_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lots" ADD CONSTRAINT "lots_created_by_accounts_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurements" ADD CONSTRAINT "measurements_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reference_boards" ADD CONSTRAINT "reference_boards_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "retest_orders" ADD CONSTRAINT "retest_orders_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "retest_orders" ADD CONSTRAINT "retest_orders_signed_by_accounts_id_fk" FOREIGN KEY ("signed_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "retest_orders" ADD CONSTRAINT "retest_orders_used_by_run_id_runs_id_fk" FOREIGN KEY ("used_by_run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run_events" ADD CONSTRAINT "run_events_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_reference_board_id_reference_boards_id_fk" FOREIGN KEY ("reference_board_id") REFERENCES "public"."reference_boards"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "runs" ADD CONSTRAINT "runs_operator_id_accounts_id_fk" FOREIGN KEY ("operator_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_sequence_id_sequences_id_fk" FOREIGN KEY ("sequence_id") REFERENCES "public"."sequences"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_made_by_accounts_id_fk" FOREIGN KEY ("made_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequence_revisions" ADD CONSTRAINT "sequence_revisions_released_by_accounts_id_fk" FOREIGN KEY ("released_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sequences" ADD CONSTRAINT "sequences_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_in_attempts" ADD CONSTRAINT "sign_in_attempts_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "station_enrolments" ADD CONSTRAINT "station_enrolments_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "station_enrolments" ADD CONSTRAINT "station_enrolments_enrolled_by_accounts_id_fk" FOREIGN KEY ("enrolled_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stations" ADD CONSTRAINT "stations_printer_id_printers_id_fk" FOREIGN KEY ("printer_id") REFERENCES "public"."printers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "traces" ADD CONSTRAINT "traces_run_id_runs_id_fk" FOREIGN KEY ("run_id") REFERENCES "public"."runs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trail" ADD CONSTRAINT "trail_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trail" ADD CONSTRAINT "trail_station_id_stations_id_fk" FOREIGN KEY ("station_id") REFERENCES "public"."stations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trainings" ADD CONSTRAINT "trainings_account_id_accounts_id_fk" FOREIGN KEY ("account_id") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trainings" ADD CONSTRAINT "trainings_board_type_id_board_types_id_fk" FOREIGN KEY ("board_type_id") REFERENCES "public"."board_types"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trainings" ADD CONSTRAINT "trainings_recorded_by_accounts_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."accounts"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "units" ADD CONSTRAINT "units_lot_id_lots_id_fk" FOREIGN KEY ("lot_id") REFERENCES "public"."lots"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "calibrations_instrument_id_calibrated_on_index" ON "calibrations" USING btree ("instrument_id","calibrated_on");--> statement-breakpoint
CREATE INDEX "commissionings_station_id_at_index" ON "commissionings" USING btree ("station_id","at");--> statement-breakpoint
CREATE INDEX "daily_checks_station_id_at_index" ON "daily_checks" USING btree ("station_id","at");--> statement-breakpoint
CREATE INDEX "dispositions_unit_id_index" ON "dispositions" USING btree ("unit_id");--> statement-breakpoint
CREATE INDEX "dispositions_run_id_index" ON "dispositions" USING btree ("run_id");--> statement-breakpoint
CREATE UNIQUE INDEX "engineer_calls_one_open" ON "engineer_calls" USING btree ("station_id") WHERE "engineer_calls"."acknowledged_at" is null;--> statement-breakpoint
CREATE INDEX "instruments_station_id_index" ON "instruments" USING btree ("station_id");--> statement-breakpoint
CREATE INDEX "labels_state_index" ON "labels" USING btree ("state");--> statement-breakpoint
CREATE INDEX "labels_unit_id_index" ON "labels" USING btree ("unit_id");--> statement-breakpoint
CREATE INDEX "labels_run_id_index" ON "labels" USING btree ("run_id");--> statement-breakpoint
CREATE INDEX "lot_components_lot_id_component_from_at_index" ON "lot_components" USING btree ("lot_id","component","from_at");--> statement-breakpoint
CREATE INDEX "lots_state_index" ON "lots" USING btree ("state");--> statement-breakpoint
CREATE INDEX "measurements_quantity_phase_index" ON "measurements" USING btree ("quantity","phase");--> statement-breakpoint
CREATE INDEX "retest_orders_unit_id_index" ON "retest_orders" USING btree ("unit_id");--> statement-breakpoint
CREATE UNIQUE INDEX "runs_one_open_per_station" ON "runs" USING btree ("station_id") WHERE "runs"."ended_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "runs_one_open_per_unit" ON "runs" USING btree ("unit_id") WHERE "runs"."ended_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX "runs_attempt_of_unit" ON "runs" USING btree ("unit_id","kind","attempt");--> statement-breakpoint
CREATE INDEX "runs_lot_id_started_at_index" ON "runs" USING btree ("lot_id","started_at");--> statement-breakpoint
CREATE INDEX "runs_station_id_started_at_index" ON "runs" USING btree ("station_id","started_at");--> statement-breakpoint
CREATE INDEX "runs_started_at_index" ON "runs" USING btree ("started_at");--> statement-breakpoint
CREATE INDEX "sessions_account_id_index" ON "sessions" USING btree ("account_id");--> statement-breakpoint
CREATE INDEX "sessions_station_id_index" ON "sessions" USING btree ("station_id") WHERE "sessions"."ended_at" is null;--> statement-breakpoint
CREATE INDEX "sign_in_attempts_identifier_station_id_at_index" ON "sign_in_attempts" USING btree ("identifier","station_id","at");--> statement-breakpoint
CREATE INDEX "station_enrolments_station_id_index" ON "station_enrolments" USING btree ("station_id");--> statement-breakpoint
CREATE INDEX "trail_entity_entity_id_at_index" ON "trail" USING btree ("entity","entity_id","at");--> statement-breakpoint
CREATE INDEX "trail_at_index" ON "trail" USING btree ("at");--> statement-breakpoint
CREATE INDEX "trail_account_id_index" ON "trail" USING btree ("account_id");--> statement-breakpoint
CREATE INDEX "trainings_account_id_board_type_id_index" ON "trainings" USING btree ("account_id","board_type_id");