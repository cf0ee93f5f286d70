ALTER TABLE "labels" ADD COLUMN "next_try_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "labels" ADD COLUMN "printer_job_id" integer;