CREATE SCHEMA "app";
--> statement-breakpoint
CREATE SEQUENCE "app"."screening_number" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1;--> statement-breakpoint
CREATE TABLE "app"."auth_throttle" (
	"key" text PRIMARY KEY NOT NULL,
	"failures" integer DEFAULT 0 NOT NULL,
	"window_started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"blocked_until" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "app"."credential" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"password_hash" text NOT NULL,
	"must_change" boolean DEFAULT false NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "app"."person_setting" (
	"person_id" uuid PRIMARY KEY NOT NULL,
	"units" text DEFAULT 'SI' NOT NULL,
	"theme" text DEFAULT 'system' NOT NULL,
	"email" text
);
--> statement-breakpoint
CREATE TABLE "app"."session" (
	"id_sha256" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	"user_agent" text DEFAULT '' NOT NULL,
	"ip_net" "inet"
);
--> statement-breakpoint
CREATE TABLE "app"."ceremony" (
	"nonce" text PRIMARY KEY NOT NULL,
	"idempotency_key" text NOT NULL,
	"person_id" uuid NOT NULL,
	"session_id" text,
	"screening_id" uuid NOT NULL,
	"rev" integer NOT NULL,
	"act" text NOT NULL,
	"shown_sha256" text NOT NULL,
	"method" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone DEFAULT now() + interval '5 minutes' NOT NULL,
	"proved_at" timestamp with time zone,
	"used_at" timestamp with time zone,
	CONSTRAINT "ceremony_idempotency_key_unique" UNIQUE("idempotency_key"),
	CONSTRAINT "ceremony_method_with_proof" CHECK (("app"."ceremony"."method" is null) = ("app"."ceremony"."proved_at" is null))
);
--> statement-breakpoint
CREATE TABLE "app"."draft" (
	"screening_id" uuid NOT NULL,
	"rev" integer NOT NULL,
	"author_id" uuid NOT NULL,
	"document" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"contributors" uuid[] DEFAULT '{}' NOT NULL,
	"replaces_rev" integer,
	"reason" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_by" uuid NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"prepared_version" integer,
	"prepared_sha256" text,
	"prepared_at" timestamp with time zone,
	"prepared" jsonb,
	CONSTRAINT "draft_screening_id_rev_pk" PRIMARY KEY("screening_id","rev"),
	CONSTRAINT "draft_rev_from_one" CHECK ("app"."draft"."rev" >= 1),
	CONSTRAINT "draft_version_from_one" CHECK ("app"."draft"."version" >= 1),
	CONSTRAINT "draft_prepared_sha256" CHECK ("app"."draft"."prepared_sha256" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "draft_prepared_together" CHECK (num_nulls("app"."draft"."prepared", "app"."draft"."prepared_sha256", "app"."draft"."prepared_version", "app"."draft"."prepared_at") in (0, 4)),
	CONSTRAINT "draft_reason_with_replacement" CHECK (("app"."draft"."rev" = 1) = ("app"."draft"."replaces_rev" is null))
);
--> statement-breakpoint
CREATE TABLE "app"."facility" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"demo" boolean DEFAULT false NOT NULL,
	"barometric_pressure_pa" double precision NOT NULL,
	"policy" jsonb NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "facility_code_unique" UNIQUE("code")
);
--> statement-breakpoint
CREATE TABLE "app"."outbox" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"message_id" text NOT NULL,
	"to" text NOT NULL,
	"subject" text NOT NULL,
	"text" text NOT NULL,
	"html" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"next_attempt_at" timestamp with time zone DEFAULT now() NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text,
	"sent_at" timestamp with time zone,
	"dead_at" timestamp with time zone,
	CONSTRAINT "outbox_message_id_unique" UNIQUE("message_id")
);
--> statement-breakpoint
CREATE TABLE "app"."remark" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"screening_id" uuid NOT NULL,
	"rev" integer NOT NULL,
	"line" text NOT NULL,
	"text" text NOT NULL,
	"author_id" uuid NOT NULL,
	"entry_seq" bigint,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "app"."screening" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer DEFAULT nextval('app.screening_number') NOT NULL,
	"section_id" uuid NOT NULL,
	"title" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "screening_number_unique" UNIQUE("number")
);
--> statement-breakpoint
CREATE TABLE "app"."section" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"facility_id" uuid NOT NULL,
	"tag" text NOT NULL,
	"name" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "section_tag_in_facility" UNIQUE("facility_id","tag")
);
--> statement-breakpoint
CREATE TABLE "app"."security_event" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "app"."security_event_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"kind" text NOT NULL,
	"person_id" uuid,
	"details" jsonb NOT NULL
);
--> statement-breakpoint
ALTER TABLE "app"."ceremony" ADD CONSTRAINT "ceremony_session_id_session_id_sha256_fk" FOREIGN KEY ("session_id") REFERENCES "app"."session"("id_sha256") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "app"."ceremony" ADD CONSTRAINT "ceremony_screening_id_screening_id_fk" FOREIGN KEY ("screening_id") REFERENCES "app"."screening"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "app"."draft" ADD CONSTRAINT "draft_screening_id_screening_id_fk" FOREIGN KEY ("screening_id") REFERENCES "app"."screening"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "app"."remark" ADD CONSTRAINT "remark_screening_id_screening_id_fk" FOREIGN KEY ("screening_id") REFERENCES "app"."screening"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "app"."screening" ADD CONSTRAINT "screening_section_id_section_id_fk" FOREIGN KEY ("section_id") REFERENCES "app"."section"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "app"."section" ADD CONSTRAINT "section_facility_id_facility_id_fk" FOREIGN KEY ("facility_id") REFERENCES "app"."facility"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "session_by_person" ON "app"."session" USING btree ("person_id","created_at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "ceremony_by_expiry" ON "app"."ceremony" USING btree ("expires_at");--> statement-breakpoint
CREATE INDEX "draft_by_author" ON "app"."draft" USING btree ("author_id","updated_at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "outbox_waiting" ON "app"."outbox" USING btree ("next_attempt_at") WHERE sent_at is null and dead_at is null;--> statement-breakpoint
CREATE INDEX "remark_by_revision" ON "app"."remark" USING btree ("screening_id","rev");--> statement-breakpoint
CREATE INDEX "screening_by_section" ON "app"."screening" USING btree ("section_id","number" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "security_event_by_person" ON "app"."security_event" USING btree ("person_id","id" DESC NULLS LAST);