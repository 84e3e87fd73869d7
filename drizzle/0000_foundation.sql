CREATE TABLE "audit_log" (
	"workspace_id" uuid NOT NULL,
	"sequence" bigserial NOT NULL,
	"at" timestamp(3) with time zone NOT NULL,
	"member_id" uuid,
	"actor" text NOT NULL,
	"action" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" text NOT NULL,
	"detail" jsonb NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "audit_log_workspace_id_sequence_pk" PRIMARY KEY("workspace_id","sequence")
);
--> statement-breakpoint
ALTER TABLE "audit_log" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "comments" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"body" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "comments_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "comments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "idempotency_keys" (
	"workspace_id" uuid NOT NULL,
	"key" text NOT NULL,
	"use_case" text NOT NULL,
	"input_hash" text NOT NULL,
	"response" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_keys_workspace_id_key_pk" PRIMARY KEY("workspace_id","key")
);
--> statement-breakpoint
ALTER TABLE "idempotency_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "mails" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"workspace_id" uuid,
	"contact_id" uuid,
	"template" text NOT NULL,
	"recipient" text NOT NULL,
	"subject" text NOT NULL,
	"data" jsonb NOT NULL,
	"status" text DEFAULT 'queued' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text,
	"message_id" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "mails" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "notifications" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"member_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"title" text NOT NULL,
	"body" text DEFAULT '' NOT NULL,
	"href" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"read_at" timestamp with time zone,
	CONSTRAINT "notifications_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "notifications" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "credentials" (
	"id" text PRIMARY KEY NOT NULL,
	"account_id" text NOT NULL,
	"provider_id" text NOT NULL,
	"user_id" text NOT NULL,
	"access_token" text,
	"refresh_token" text,
	"id_token" text,
	"access_token_expires_at" timestamp with time zone,
	"refresh_token_expires_at" timestamp with time zone,
	"scope" text,
	"password" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"id" text PRIMARY KEY NOT NULL,
	"key" text NOT NULL,
	"count" integer NOT NULL,
	"last_request" bigint NOT NULL,
	CONSTRAINT "rate_limits_key_unique" UNIQUE("key")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"token" text NOT NULL,
	"user_id" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"ip_address" text,
	"user_agent" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sessions_token_unique" UNIQUE("token")
);
--> statement-breakpoint
CREATE TABLE "two_factors" (
	"id" text PRIMARY KEY NOT NULL,
	"secret" text NOT NULL,
	"backup_codes" text NOT NULL,
	"user_id" text NOT NULL,
	"verified" boolean DEFAULT true NOT NULL,
	"failed_verification_count" integer DEFAULT 0 NOT NULL,
	"locked_until" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"email_verified" boolean DEFAULT false NOT NULL,
	"image" text,
	"two_factor_enabled" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_email_unique" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "verifications" (
	"id" text PRIMARY KEY NOT NULL,
	"identifier" text NOT NULL,
	"value" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "animal_loci" (
	"workspace_id" uuid NOT NULL,
	"animal_id" uuid NOT NULL,
	"locus_id" uuid NOT NULL,
	"claim" jsonb NOT NULL,
	"recorded_on" date,
	CONSTRAINT "animal_loci_workspace_id_animal_id_locus_id_pk" PRIMARY KEY("workspace_id","animal_id","locus_id")
);
--> statement-breakpoint
ALTER TABLE "animal_loci" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "animals" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text DEFAULT '' NOT NULL,
	"species_id" uuid NOT NULL,
	"sex" text DEFAULT 'unknown' NOT NULL,
	"sexed_by" text,
	"hatched_on" date,
	"hatched_precision" text DEFAULT 'day' NOT NULL,
	"origin" text DEFAULT 'unknown' NOT NULL,
	"status" text DEFAULT 'here' NOT NULL,
	"status_since" date,
	"notes" text DEFAULT '' NOT NULL,
	"dam_id" uuid,
	"sire_id" uuid,
	"clutch_id" uuid,
	"hatch_number" smallint,
	"tub_id" uuid,
	"held_back" boolean DEFAULT false NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "animals_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "animals_code" UNIQUE("workspace_id","code"),
	CONSTRAINT "animals_sex" CHECK ("animals"."sex" in ('male', 'female', 'unknown')),
	CONSTRAINT "animals_not_own_parent" CHECK ("animals"."dam_id" is distinct from "animals"."id" and "animals"."sire_id" is distinct from "animals"."id")
);
--> statement-breakpoint
ALTER TABLE "animals" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "documents" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"name" text NOT NULL,
	"storage_key" text NOT NULL,
	"content_type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"uploaded_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "documents_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "documents" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ownership_parts" (
	"workspace_id" uuid NOT NULL,
	"ownership_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"parts" integer NOT NULL,
	CONSTRAINT "ownership_parts_workspace_id_ownership_id_party_id_pk" PRIMARY KEY("workspace_id","ownership_id","party_id"),
	CONSTRAINT "ownership_parts_positive" CHECK ("ownership_parts"."parts" > 0)
);
--> statement-breakpoint
ALTER TABLE "ownership_parts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ownerships" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"animal_id" uuid NOT NULL,
	"from_day" date NOT NULL,
	"until_day" date,
	"reason" text NOT NULL,
	"price" bigint,
	"note" text DEFAULT '' NOT NULL,
	"derivation" jsonb,
	"recorded_by" uuid,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "ownerships_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "ownerships_order" CHECK ("ownerships"."until_day" is null or "ownerships"."until_day" >= "ownerships"."from_day")
);
--> statement-breakpoint
ALTER TABLE "ownerships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "photos" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"animal_id" uuid NOT NULL,
	"storage_key" text NOT NULL,
	"content_type" text NOT NULL,
	"width" integer NOT NULL,
	"height" integer NOT NULL,
	"sha256" text NOT NULL,
	"caption" text DEFAULT '' NOT NULL,
	"taken_on" date,
	"position" smallint DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "photos_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "photos" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "possible_sires" (
	"workspace_id" uuid NOT NULL,
	"animal_id" uuid NOT NULL,
	"sire_id" uuid NOT NULL,
	"weight" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "possible_sires_workspace_id_animal_id_sire_id_pk" PRIMARY KEY("workspace_id","animal_id","sire_id"),
	CONSTRAINT "possible_sires_weight" CHECK ("possible_sires"."weight" > 0)
);
--> statement-breakpoint
ALTER TABLE "possible_sires" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "tubs" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"room" text NOT NULL,
	"rack" text NOT NULL,
	"label" text NOT NULL,
	"row_number" smallint NOT NULL,
	"column_number" smallint NOT NULL,
	"purpose" text DEFAULT 'adult' NOT NULL,
	CONSTRAINT "tubs_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "tubs_label" UNIQUE("workspace_id","label"),
	CONSTRAINT "tubs_position" UNIQUE("workspace_id","room","rack","row_number","column_number")
);
--> statement-breakpoint
ALTER TABLE "tubs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "weights" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"animal_id" uuid NOT NULL,
	"weighed_on" date NOT NULL,
	"grams" integer NOT NULL,
	"recorded_by" uuid,
	CONSTRAINT "weights_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "weights_positive" CHECK ("weights"."grams" > 0)
);
--> statement-breakpoint
ALTER TABLE "weights" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "combinations" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"species_id" uuid NOT NULL,
	"name" text NOT NULL,
	"phenotypes" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "combinations_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "combinations_name" UNIQUE("workspace_id","species_id","name")
);
--> statement-breakpoint
ALTER TABLE "combinations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "loci" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"species_id" uuid NOT NULL,
	"name" text NOT NULL,
	"definition" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "loci_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "loci_name" UNIQUE("workspace_id","species_id","name")
);
--> statement-breakpoint
ALTER TABLE "loci" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "species" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"scientific_name" text DEFAULT '' NOT NULL,
	"sex_system" text NOT NULL,
	"code_prefix" text NOT NULL,
	"profile" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "species_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "species_name" UNIQUE("workspace_id","name"),
	CONSTRAINT "species_code_prefix" UNIQUE("workspace_id","code_prefix")
);
--> statement-breakpoint
ALTER TABLE "species" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "accounts" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"type" text NOT NULL,
	"purpose" text NOT NULL,
	"party_id" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "accounts_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "accounts_code" UNIQUE("workspace_id","code"),
	CONSTRAINT "accounts_purpose" UNIQUE NULLS NOT DISTINCT("workspace_id","purpose","party_id"),
	CONSTRAINT "accounts_type" CHECK ("accounts"."type" in ('asset', 'liability', 'equity', 'revenue', 'expense'))
);
--> statement-breakpoint
ALTER TABLE "accounts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "entries" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"number" integer NOT NULL,
	"event_on" date NOT NULL,
	"posted_on" date NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	"cause_kind" text NOT NULL,
	"cause_id" uuid NOT NULL,
	"memo" text NOT NULL,
	"reverses_id" uuid,
	"recorded_by" uuid,
	CONSTRAINT "entries_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "entries_number" UNIQUE("workspace_id","number"),
	CONSTRAINT "entries_reversed_once" UNIQUE("workspace_id","reverses_id")
);
--> statement-breakpoint
ALTER TABLE "entries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "expenses" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"spent_on" date NOT NULL,
	"description" text NOT NULL,
	"category" text NOT NULL,
	"amount" bigint NOT NULL,
	"paid_by" uuid,
	"in_kind" integer DEFAULT 0 NOT NULL,
	"project_id" uuid,
	"animal_id" uuid,
	"clutch_id" uuid,
	"recovered" bigint DEFAULT 0 NOT NULL,
	"recorded_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "expenses_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "expenses_amounts" CHECK ("expenses"."amount" > 0 and "expenses"."recovered" between 0 and "expenses"."amount")
);
--> statement-breakpoint
ALTER TABLE "expenses" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "postings" (
	"workspace_id" uuid NOT NULL,
	"entry_id" uuid NOT NULL,
	"line" smallint NOT NULL,
	"account_id" uuid NOT NULL,
	"side" text NOT NULL,
	"amount" bigint NOT NULL,
	"currency" text NOT NULL,
	"party_id" uuid,
	"project_id" uuid,
	"animal_id" uuid,
	"why" text DEFAULT '' NOT NULL,
	CONSTRAINT "postings_workspace_id_entry_id_line_pk" PRIMARY KEY("workspace_id","entry_id","line"),
	CONSTRAINT "postings_amount" CHECK ("postings"."amount" between 1 and 9007199254740991),
	CONSTRAINT "postings_side" CHECK ("postings"."side" in ('debit', 'credit'))
);
--> statement-breakpoint
ALTER TABLE "postings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "sale_splits" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"invoice_id" uuid NOT NULL,
	"animal_id" uuid NOT NULL,
	"payment_id" uuid,
	"refund_id" uuid,
	"terms_id" uuid,
	"entry_id" uuid NOT NULL,
	"split" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sale_splits_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "sale_splits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "settlement_decisions" (
	"workspace_id" uuid NOT NULL,
	"settlement_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"comment" text DEFAULT '' NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "settlement_decisions_workspace_id_settlement_id_party_id_pk" PRIMARY KEY("workspace_id","settlement_id","party_id")
);
--> statement-breakpoint
ALTER TABLE "settlement_decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "settlement_transfers" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"settlement_id" uuid NOT NULL,
	"from_party" uuid,
	"to_party" uuid,
	"amount" bigint NOT NULL,
	"paid_on" date,
	"reference" text DEFAULT '' NOT NULL,
	"entry_id" uuid,
	CONSTRAINT "settlement_transfers_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "settlement_transfers_positive" CHECK ("settlement_transfers"."amount" > 0)
);
--> statement-breakpoint
ALTER TABLE "settlement_transfers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "settlements" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"number" integer NOT NULL,
	"from_day" date NOT NULL,
	"through_day" date NOT NULL,
	"project_id" uuid,
	"status" text DEFAULT 'proposed' NOT NULL,
	"snapshot" jsonb NOT NULL,
	"hash" text NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "settlements_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "settlements_number" UNIQUE("workspace_id","number")
);
--> statement-breakpoint
ALTER TABLE "settlements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "project_animals" (
	"workspace_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"animal_id" uuid NOT NULL,
	"added_on" date NOT NULL,
	CONSTRAINT "project_animals_workspace_id_project_id_animal_id_pk" PRIMARY KEY("workspace_id","project_id","animal_id")
);
--> statement-breakpoint
ALTER TABLE "project_animals" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "project_parties" (
	"workspace_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"rank" smallint NOT NULL,
	"joined_on" date NOT NULL,
	"left_on" date,
	CONSTRAINT "project_parties_workspace_id_project_id_party_id_pk" PRIMARY KEY("workspace_id","project_id","party_id")
);
--> statement-breakpoint
ALTER TABLE "project_parties" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "projects" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"purpose" text DEFAULT '' NOT NULL,
	"species_id" uuid NOT NULL,
	"started_on" date NOT NULL,
	"ended_on" date,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "projects_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "projects_name" UNIQUE("workspace_id","name")
);
--> statement-breakpoint
ALTER TABLE "projects" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "terms_decisions" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"terms_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"comment" text DEFAULT '' NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "terms_decisions_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "terms_decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "terms_versions" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"status" text NOT NULL,
	"content" jsonb NOT NULL,
	"in_force_from" date NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"proposed_by" uuid NOT NULL,
	"proposed_at" timestamp with time zone,
	"locked_at" timestamp with time zone,
	"previous_hash" text,
	"hash" text,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "terms_versions_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "terms_versions_number" UNIQUE("workspace_id","project_id","number"),
	CONSTRAINT "terms_versions_locked" CHECK (("terms_versions"."status" = 'agreed') = ("terms_versions"."locked_at" is not null))
);
--> statement-breakpoint
ALTER TABLE "terms_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "checkouts" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"invoice_id" uuid NOT NULL,
	"attempt" integer NOT NULL,
	"amount" bigint NOT NULL,
	"session_id" text,
	"url" text,
	"status" text DEFAULT 'open' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "checkouts_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "checkouts_session_id_unique" UNIQUE("session_id"),
	CONSTRAINT "checkouts_attempt" UNIQUE("workspace_id","invoice_id","attempt")
);
--> statement-breakpoint
ALTER TABLE "checkouts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "contact_events" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"contact_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"body" text NOT NULL,
	"happened_at" timestamp with time zone DEFAULT now() NOT NULL,
	"recorded_by" uuid,
	CONSTRAINT "contact_events_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "contact_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "contacts" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text,
	"phone" text DEFAULT '' NOT NULL,
	"address" jsonb NOT NULL,
	"kind" text DEFAULT 'buyer' NOT NULL,
	"tags" text[] DEFAULT '{}'::text[] NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"follow_up_on" date,
	"follow_up_note" text DEFAULT '' NOT NULL,
	"follow_up_reminder_sent_on" date,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "contacts_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "contacts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "instalments" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"invoice_id" uuid NOT NULL,
	"position" smallint NOT NULL,
	"label" text NOT NULL,
	"due_on" date NOT NULL,
	"amount" bigint NOT NULL,
	"reminder_sent_on" date,
	CONSTRAINT "instalments_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "instalments_position" UNIQUE("workspace_id","invoice_id","position"),
	CONSTRAINT "instalments_positive" CHECK ("instalments"."amount" > 0)
);
--> statement-breakpoint
ALTER TABLE "instalments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invoice_lines" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"invoice_id" uuid NOT NULL,
	"position" smallint NOT NULL,
	"kind" text NOT NULL,
	"animal_id" uuid,
	"project_id" uuid,
	"description" text NOT NULL,
	"amount" bigint NOT NULL,
	"taxed" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "invoice_lines_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "invoice_lines_position" UNIQUE("workspace_id","invoice_id","position"),
	CONSTRAINT "invoice_lines_animal_named" CHECK (("invoice_lines"."kind" = 'animal') = ("invoice_lines"."animal_id" is not null))
);
--> statement-breakpoint
ALTER TABLE "invoice_lines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invoices" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"number" text,
	"contact_id" uuid NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"currency" text NOT NULL,
	"tax_basis_points" integer DEFAULT 0 NOT NULL,
	"subtotal" bigint NOT NULL,
	"shipping" bigint DEFAULT 0 NOT NULL,
	"discount" bigint DEFAULT 0 NOT NULL,
	"tax" bigint NOT NULL,
	"total" bigint NOT NULL,
	"paid" bigint DEFAULT 0 NOT NULL,
	"refunded" bigint DEFAULT 0 NOT NULL,
	"issued_on" date,
	"sent_at" timestamp with time zone,
	"delivered_on" date,
	"voided_at" timestamp with time zone,
	"note" text DEFAULT '' NOT NULL,
	"link_hash" text,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invoices_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "invoices_link_hash_unique" UNIQUE("link_hash"),
	CONSTRAINT "invoices_number" UNIQUE("workspace_id","number"),
	CONSTRAINT "invoices_adds_up" CHECK ("invoices"."subtotal" - "invoices"."discount" + "invoices"."shipping" + "invoices"."tax" = "invoices"."total" and "invoices"."total" between 0 and 9007199254740991),
	CONSTRAINT "invoices_paid" CHECK ("invoices"."paid" >= 0 and "invoices"."refunded" between 0 and "invoices"."paid")
);
--> statement-breakpoint
ALTER TABLE "invoices" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "listings" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"animal_id" uuid NOT NULL,
	"state" text DEFAULT 'not_listed' NOT NULL,
	"price" bigint,
	"headline" text DEFAULT '' NOT NULL,
	"held_for" uuid,
	"held_until" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "listings_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "listings_animal" UNIQUE("workspace_id","animal_id"),
	CONSTRAINT "listings_price" CHECK ("listings"."price" is null or "listings"."price" between 0 and 9007199254740991)
);
--> statement-breakpoint
ALTER TABLE "listings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "payment_service_events" (
	"workspace_id" uuid NOT NULL,
	"event_id" text NOT NULL,
	"type" text NOT NULL,
	"object_id" text NOT NULL,
	"received_at" timestamp with time zone DEFAULT now() NOT NULL,
	"outcome" text NOT NULL,
	CONSTRAINT "payment_service_events_workspace_id_event_id_pk" PRIMARY KEY("workspace_id","event_id")
);
--> statement-breakpoint
ALTER TABLE "payment_service_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "payments" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"invoice_id" uuid NOT NULL,
	"method" text NOT NULL,
	"amount" bigint NOT NULL,
	"fee" bigint DEFAULT 0 NOT NULL,
	"received_on" date NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	"intent_id" text,
	"charge_id" text,
	"balance_transaction_id" text,
	"reference" text DEFAULT '' NOT NULL,
	"recorded_by" uuid,
	CONSTRAINT "payments_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "payments_intent_id_unique" UNIQUE("intent_id"),
	CONSTRAINT "payments_charge_id_unique" UNIQUE("charge_id"),
	CONSTRAINT "payments_balance_transaction_id_unique" UNIQUE("balance_transaction_id"),
	CONSTRAINT "payments_positive" CHECK ("payments"."amount" > 0 and "payments"."fee" >= 0)
);
--> statement-breakpoint
ALTER TABLE "payments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "refunds" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"payment_id" uuid NOT NULL,
	"invoice_id" uuid NOT NULL,
	"amount" bigint NOT NULL,
	"reason" text NOT NULL,
	"status" text NOT NULL,
	"service_refund_id" text,
	"refunded_on" date NOT NULL,
	"recorded_by" uuid,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "refunds_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "refunds_service_refund_id_unique" UNIQUE("service_refund_id"),
	CONSTRAINT "refunds_positive" CHECK ("refunds"."amount" > 0)
);
--> statement-breakpoint
ALTER TABLE "refunds" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "clutches" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"code" text NOT NULL,
	"pairing_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"terms_id" uuid NOT NULL,
	"laid_on" date NOT NULL,
	"eggs" smallint NOT NULL,
	"slugs" smallint DEFAULT 0 NOT NULL,
	"clutch_grams" integer,
	"incubator_label" text DEFAULT '' NOT NULL,
	"incubation_decicelsius" integer,
	"hatched_on" date,
	"note" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "clutches_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "clutches_code" UNIQUE("workspace_id","code"),
	CONSTRAINT "clutches_counts" CHECK ("clutches"."eggs" >= 0 and "clutches"."slugs" >= 0 and "clutches"."eggs" + "clutches"."slugs" > 0)
);
--> statement-breakpoint
ALTER TABLE "clutches" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "pairing_decisions" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"pairing_version_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"comment" text DEFAULT '' NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "pairing_decisions_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "pairing_decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "pairing_events" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"pairing_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"seen_on" date NOT NULL,
	"minutes" integer,
	"note" text DEFAULT '' NOT NULL,
	"recorded_by" uuid NOT NULL,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	"retracted_at" timestamp with time zone,
	CONSTRAINT "pairing_events_workspace_id_id_pk" PRIMARY KEY("workspace_id","id")
);
--> statement-breakpoint
ALTER TABLE "pairing_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "pairing_versions" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"pairing_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"terms_id" uuid NOT NULL,
	"plan" jsonb NOT NULL,
	"figures" jsonb NOT NULL,
	"proposed_by" uuid NOT NULL,
	"proposed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"answer_by" date,
	"locked_at" timestamp with time zone,
	"previous_hash" text,
	"hash" text,
	CONSTRAINT "pairing_versions_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "pairing_versions_number" UNIQUE("workspace_id","pairing_id","number")
);
--> statement-breakpoint
ALTER TABLE "pairing_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "pairings" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"project_id" uuid NOT NULL,
	"season" integer NOT NULL,
	"sire_id" uuid NOT NULL,
	"dam_id" uuid NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "pairings_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "pairings_two_animals" CHECK ("pairings"."sire_id" <> "pairings"."dam_id")
);
--> statement-breakpoint
ALTER TABLE "pairings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "closed_periods" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"from_day" date NOT NULL,
	"through_day" date NOT NULL,
	"closed_by" uuid NOT NULL,
	"closed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"reopened_at" timestamp with time zone,
	"reopen_reason" text,
	CONSTRAINT "closed_periods_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "closed_periods_order" CHECK ("closed_periods"."from_day" <= "closed_periods"."through_day")
);
--> statement-breakpoint
ALTER TABLE "closed_periods" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invitations" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"role" text NOT NULL,
	"party_id" uuid,
	"project_ids" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invitations_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "invitations_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "members" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"user_id" text NOT NULL,
	"role" text NOT NULL,
	"party_id" uuid,
	"joined_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "members_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "members_role" CHECK ("members"."role" in ('owner', 'partner', 'keeper', 'accountant'))
);
--> statement-breakpoint
ALTER TABLE "members" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "parties" (
	"workspace_id" uuid NOT NULL,
	"id" uuid DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"kind" text DEFAULT 'partner' NOT NULL,
	"mark" smallint NOT NULL,
	"email" text,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "parties_workspace_id_id_pk" PRIMARY KEY("workspace_id","id"),
	CONSTRAINT "parties_name" UNIQUE("workspace_id","name"),
	CONSTRAINT "parties_mark" CHECK ("parties"."mark" between 0 and 7)
);
--> statement-breakpoint
ALTER TABLE "parties" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "workspaces" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"facility_name" text DEFAULT '' NOT NULL,
	"currency" text DEFAULT 'USD' NOT NULL,
	"time_zone" text DEFAULT 'UTC' NOT NULL,
	"temperature_unit" text DEFAULT 'C' NOT NULL,
	"sales_tax_basis_points" integer DEFAULT 0 NOT NULL,
	"recognition" text DEFAULT 'on_receipt' NOT NULL,
	"invoice_prefix" text DEFAULT '' NOT NULL,
	"next_invoice_number" integer DEFAULT 1 NOT NULL,
	"next_entry_number" integer DEFAULT 1 NOT NULL,
	"limits" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "workspaces_slug_unique" UNIQUE("slug")
);
--> statement-breakpoint
ALTER TABLE "workspaces" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "audit_log" ADD CONSTRAINT "audit_log_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_log" ADD CONSTRAINT "audit_log_member" FOREIGN KEY ("workspace_id","member_id") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_member" FOREIGN KEY ("workspace_id","member_id") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "idempotency_keys" ADD CONSTRAINT "idempotency_keys_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notifications" ADD CONSTRAINT "notifications_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notifications" ADD CONSTRAINT "notifications_member_fk" FOREIGN KEY ("workspace_id","member_id") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "credentials" ADD CONSTRAINT "credentials_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "two_factors" ADD CONSTRAINT "two_factors_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animal_loci" ADD CONSTRAINT "animal_loci_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animal_loci" ADD CONSTRAINT "animal_loci_animal" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animal_loci" ADD CONSTRAINT "animal_loci_locus" FOREIGN KEY ("workspace_id","locus_id") REFERENCES "public"."loci"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animals" ADD CONSTRAINT "animals_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animals" ADD CONSTRAINT "animals_species_fk" FOREIGN KEY ("workspace_id","species_id") REFERENCES "public"."species"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animals" ADD CONSTRAINT "animals_dam_fk" FOREIGN KEY ("workspace_id","dam_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animals" ADD CONSTRAINT "animals_sire_fk" FOREIGN KEY ("workspace_id","sire_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "animals" ADD CONSTRAINT "animals_tub_fk" FOREIGN KEY ("workspace_id","tub_id") REFERENCES "public"."tubs"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "documents" ADD CONSTRAINT "documents_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "documents" ADD CONSTRAINT "documents_uploaded_by" FOREIGN KEY ("workspace_id","uploaded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownership_parts" ADD CONSTRAINT "ownership_parts_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownership_parts" ADD CONSTRAINT "ownership_parts_ownership" FOREIGN KEY ("workspace_id","ownership_id") REFERENCES "public"."ownerships"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownership_parts" ADD CONSTRAINT "ownership_parts_party_fk" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownerships" ADD CONSTRAINT "ownerships_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownerships" ADD CONSTRAINT "ownerships_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ownerships" ADD CONSTRAINT "ownerships_recorded_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "possible_sires" ADD CONSTRAINT "possible_sires_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "possible_sires" ADD CONSTRAINT "possible_sires_animal" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "possible_sires" ADD CONSTRAINT "possible_sires_sire" FOREIGN KEY ("workspace_id","sire_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tubs" ADD CONSTRAINT "tubs_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "weights" ADD CONSTRAINT "weights_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "weights" ADD CONSTRAINT "weights_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "weights" ADD CONSTRAINT "weights_recorded_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "combinations" ADD CONSTRAINT "combinations_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "combinations" ADD CONSTRAINT "combinations_species" FOREIGN KEY ("workspace_id","species_id") REFERENCES "public"."species"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "loci" ADD CONSTRAINT "loci_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "loci" ADD CONSTRAINT "loci_species" FOREIGN KEY ("workspace_id","species_id") REFERENCES "public"."species"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "species" ADD CONSTRAINT "species_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accounts" ADD CONSTRAINT "accounts_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accounts" ADD CONSTRAINT "accounts_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entries" ADD CONSTRAINT "entries_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entries" ADD CONSTRAINT "entries_reverses" FOREIGN KEY ("workspace_id","reverses_id") REFERENCES "public"."entries"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "entries" ADD CONSTRAINT "entries_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "expenses" ADD CONSTRAINT "expenses_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "expenses" ADD CONSTRAINT "expenses_paid_by" FOREIGN KEY ("workspace_id","paid_by") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "expenses" ADD CONSTRAINT "expenses_project_fk" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "expenses" ADD CONSTRAINT "expenses_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_entry" FOREIGN KEY ("workspace_id","entry_id") REFERENCES "public"."entries"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_account_fk" FOREIGN KEY ("workspace_id","account_id") REFERENCES "public"."accounts"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_party_fk" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "postings" ADD CONSTRAINT "postings_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_invoice_fk" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_payment" FOREIGN KEY ("workspace_id","payment_id") REFERENCES "public"."payments"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_refund" FOREIGN KEY ("workspace_id","refund_id") REFERENCES "public"."refunds"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_terms" FOREIGN KEY ("workspace_id","terms_id") REFERENCES "public"."terms_versions"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sale_splits" ADD CONSTRAINT "sale_splits_entry" FOREIGN KEY ("workspace_id","entry_id") REFERENCES "public"."entries"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_decisions" ADD CONSTRAINT "settlement_decisions_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_decisions" ADD CONSTRAINT "settlement_decisions_settlement" FOREIGN KEY ("workspace_id","settlement_id") REFERENCES "public"."settlements"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_decisions" ADD CONSTRAINT "settlement_decisions_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_decisions" ADD CONSTRAINT "settlement_decisions_by" FOREIGN KEY ("workspace_id","decided_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_transfers" ADD CONSTRAINT "settlement_transfers_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_transfers" ADD CONSTRAINT "settlement_transfers_settlement" FOREIGN KEY ("workspace_id","settlement_id") REFERENCES "public"."settlements"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_transfers" ADD CONSTRAINT "settlement_transfers_from" FOREIGN KEY ("workspace_id","from_party") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_transfers" ADD CONSTRAINT "settlement_transfers_to" FOREIGN KEY ("workspace_id","to_party") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement_transfers" ADD CONSTRAINT "settlement_transfers_entry" FOREIGN KEY ("workspace_id","entry_id") REFERENCES "public"."entries"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlements" ADD CONSTRAINT "settlements_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlements" ADD CONSTRAINT "settlements_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlements" ADD CONSTRAINT "settlements_by" FOREIGN KEY ("workspace_id","created_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_animals" ADD CONSTRAINT "project_animals_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_animals" ADD CONSTRAINT "project_animals_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_animals" ADD CONSTRAINT "project_animals_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_parties" ADD CONSTRAINT "project_parties_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_parties" ADD CONSTRAINT "project_parties_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "project_parties" ADD CONSTRAINT "project_parties_party_fk" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "projects" ADD CONSTRAINT "projects_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "projects" ADD CONSTRAINT "projects_species" FOREIGN KEY ("workspace_id","species_id") REFERENCES "public"."species"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_decisions" ADD CONSTRAINT "terms_decisions_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_decisions" ADD CONSTRAINT "terms_decisions_terms_fk" FOREIGN KEY ("workspace_id","terms_id") REFERENCES "public"."terms_versions"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_decisions" ADD CONSTRAINT "terms_decisions_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_decisions" ADD CONSTRAINT "terms_decisions_by" FOREIGN KEY ("workspace_id","decided_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_versions" ADD CONSTRAINT "terms_versions_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_versions" ADD CONSTRAINT "terms_versions_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "terms_versions" ADD CONSTRAINT "terms_versions_proposed_by" FOREIGN KEY ("workspace_id","proposed_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "checkouts" ADD CONSTRAINT "checkouts_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "checkouts" ADD CONSTRAINT "checkouts_invoice" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact_events" ADD CONSTRAINT "contact_events_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact_events" ADD CONSTRAINT "contact_events_contact_fk" FOREIGN KEY ("workspace_id","contact_id") REFERENCES "public"."contacts"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact_events" ADD CONSTRAINT "contact_events_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contacts" ADD CONSTRAINT "contacts_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "instalments" ADD CONSTRAINT "instalments_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "instalments" ADD CONSTRAINT "instalments_invoice" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoice_lines" ADD CONSTRAINT "invoice_lines_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoice_lines" ADD CONSTRAINT "invoice_lines_invoice" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoice_lines" ADD CONSTRAINT "invoice_lines_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoice_lines" ADD CONSTRAINT "invoice_lines_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoices" ADD CONSTRAINT "invoices_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoices" ADD CONSTRAINT "invoices_contact_fk" FOREIGN KEY ("workspace_id","contact_id") REFERENCES "public"."contacts"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invoices" ADD CONSTRAINT "invoices_created_by" FOREIGN KEY ("workspace_id","created_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_animal_fk" FOREIGN KEY ("workspace_id","animal_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listings" ADD CONSTRAINT "listings_held_for" FOREIGN KEY ("workspace_id","held_for") REFERENCES "public"."contacts"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payment_service_events" ADD CONSTRAINT "payment_service_events_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_invoice_fk" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "payments" ADD CONSTRAINT "payments_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_payment" FOREIGN KEY ("workspace_id","payment_id") REFERENCES "public"."payments"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_invoice" FOREIGN KEY ("workspace_id","invoice_id") REFERENCES "public"."invoices"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refunds" ADD CONSTRAINT "refunds_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clutches" ADD CONSTRAINT "clutches_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clutches" ADD CONSTRAINT "clutches_pairing_fk" FOREIGN KEY ("workspace_id","pairing_id") REFERENCES "public"."pairings"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clutches" ADD CONSTRAINT "clutches_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "clutches" ADD CONSTRAINT "clutches_terms" FOREIGN KEY ("workspace_id","terms_id") REFERENCES "public"."terms_versions"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_decisions" ADD CONSTRAINT "pairing_decisions_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_decisions" ADD CONSTRAINT "pairing_decisions_version_fk" FOREIGN KEY ("workspace_id","pairing_version_id") REFERENCES "public"."pairing_versions"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_decisions" ADD CONSTRAINT "pairing_decisions_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_decisions" ADD CONSTRAINT "pairing_decisions_by" FOREIGN KEY ("workspace_id","decided_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_events" ADD CONSTRAINT "pairing_events_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_events" ADD CONSTRAINT "pairing_events_pairing_fk" FOREIGN KEY ("workspace_id","pairing_id") REFERENCES "public"."pairings"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_events" ADD CONSTRAINT "pairing_events_by" FOREIGN KEY ("workspace_id","recorded_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_versions" ADD CONSTRAINT "pairing_versions_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_versions" ADD CONSTRAINT "pairing_versions_pairing" FOREIGN KEY ("workspace_id","pairing_id") REFERENCES "public"."pairings"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_versions" ADD CONSTRAINT "pairing_versions_terms" FOREIGN KEY ("workspace_id","terms_id") REFERENCES "public"."terms_versions"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairing_versions" ADD CONSTRAINT "pairing_versions_by" FOREIGN KEY ("workspace_id","proposed_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_project" FOREIGN KEY ("workspace_id","project_id") REFERENCES "public"."projects"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_sire" FOREIGN KEY ("workspace_id","sire_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_dam" FOREIGN KEY ("workspace_id","dam_id") REFERENCES "public"."animals"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pairings" ADD CONSTRAINT "pairings_created_by" FOREIGN KEY ("workspace_id","created_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "closed_periods" ADD CONSTRAINT "closed_periods_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "closed_periods" ADD CONSTRAINT "closed_periods_by" FOREIGN KEY ("workspace_id","closed_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_invited_by" FOREIGN KEY ("workspace_id","invited_by") REFERENCES "public"."members"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_party" FOREIGN KEY ("workspace_id","party_id") REFERENCES "public"."parties"("workspace_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "parties" ADD CONSTRAINT "parties_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_log_subject" ON "audit_log" USING btree ("workspace_id","subject_kind","subject_id");--> statement-breakpoint
CREATE INDEX "comments_subject" ON "comments" USING btree ("workspace_id","subject_kind","subject_id","created_at");--> statement-breakpoint
CREATE INDEX "mails_workspace" ON "mails" USING btree ("workspace_id","created_at");--> statement-breakpoint
CREATE INDEX "mails_contact" ON "mails" USING btree ("workspace_id","contact_id");--> statement-breakpoint
CREATE INDEX "notifications_member" ON "notifications" USING btree ("workspace_id","member_id","created_at");--> statement-breakpoint
CREATE INDEX "credentials_user" ON "credentials" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "two_factors_user" ON "two_factors" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "verifications_identifier" ON "verifications" USING btree ("identifier");--> statement-breakpoint
CREATE INDEX "animals_species" ON "animals" USING btree ("workspace_id","species_id");--> statement-breakpoint
CREATE INDEX "animals_dam" ON "animals" USING btree ("workspace_id","dam_id");--> statement-breakpoint
CREATE INDEX "animals_sire" ON "animals" USING btree ("workspace_id","sire_id");--> statement-breakpoint
CREATE INDEX "animals_clutch" ON "animals" USING btree ("workspace_id","clutch_id");--> statement-breakpoint
CREATE INDEX "documents_subject" ON "documents" USING btree ("workspace_id","subject_kind","subject_id");--> statement-breakpoint
CREATE INDEX "ownership_parts_party" ON "ownership_parts" USING btree ("workspace_id","party_id");--> statement-breakpoint
CREATE UNIQUE INDEX "ownerships_one_in_force" ON "ownerships" USING btree ("workspace_id","animal_id") WHERE until_day is null;--> statement-breakpoint
CREATE INDEX "ownerships_animal" ON "ownerships" USING btree ("workspace_id","animal_id","from_day");--> statement-breakpoint
CREATE INDEX "photos_animal" ON "photos" USING btree ("workspace_id","animal_id","position");--> statement-breakpoint
CREATE INDEX "weights_animal" ON "weights" USING btree ("workspace_id","animal_id","weighed_on");--> statement-breakpoint
CREATE INDEX "entries_posted" ON "entries" USING btree ("workspace_id","posted_on");--> statement-breakpoint
CREATE INDEX "entries_cause" ON "entries" USING btree ("workspace_id","cause_kind","cause_id");--> statement-breakpoint
CREATE INDEX "expenses_project" ON "expenses" USING btree ("workspace_id","project_id");--> statement-breakpoint
CREATE INDEX "postings_account" ON "postings" USING btree ("workspace_id","account_id");--> statement-breakpoint
CREATE INDEX "postings_party" ON "postings" USING btree ("workspace_id","party_id");--> statement-breakpoint
CREATE INDEX "sale_splits_invoice" ON "sale_splits" USING btree ("workspace_id","invoice_id");--> statement-breakpoint
CREATE INDEX "project_animals_animal" ON "project_animals" USING btree ("workspace_id","animal_id");--> statement-breakpoint
CREATE INDEX "project_parties_party" ON "project_parties" USING btree ("workspace_id","party_id");--> statement-breakpoint
CREATE INDEX "terms_decisions_terms" ON "terms_decisions" USING btree ("workspace_id","terms_id","decided_at");--> statement-breakpoint
CREATE UNIQUE INDEX "terms_versions_one_open" ON "terms_versions" USING btree ("workspace_id","project_id") WHERE status in ('draft', 'proposed');--> statement-breakpoint
CREATE INDEX "contact_events_contact" ON "contact_events" USING btree ("workspace_id","contact_id","happened_at");--> statement-breakpoint
CREATE INDEX "contacts_email" ON "contacts" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "contacts_follow_up" ON "contacts" USING btree ("workspace_id","follow_up_on");--> statement-breakpoint
CREATE INDEX "invoice_lines_animal" ON "invoice_lines" USING btree ("workspace_id","animal_id");--> statement-breakpoint
CREATE INDEX "invoices_contact" ON "invoices" USING btree ("workspace_id","contact_id");--> statement-breakpoint
CREATE INDEX "payments_invoice" ON "payments" USING btree ("workspace_id","invoice_id");--> statement-breakpoint
CREATE INDEX "clutches_pairing" ON "clutches" USING btree ("workspace_id","pairing_id");--> statement-breakpoint
CREATE INDEX "pairing_decisions_version" ON "pairing_decisions" USING btree ("workspace_id","pairing_version_id","decided_at");--> statement-breakpoint
CREATE INDEX "pairing_events_pairing" ON "pairing_events" USING btree ("workspace_id","pairing_id","seen_on");--> statement-breakpoint
CREATE INDEX "pairings_season" ON "pairings" USING btree ("workspace_id","season");--> statement-breakpoint
CREATE UNIQUE INDEX "pairings_once" ON "pairings" USING btree ("workspace_id","season","sire_id","dam_id") WHERE status <> 'withdrawn';--> statement-breakpoint
CREATE UNIQUE INDEX "members_one_per_person" ON "members" USING btree ("workspace_id","user_id") WHERE ended_at is null;--> statement-breakpoint
CREATE INDEX "members_user" ON "members" USING btree ("user_id");--> statement-breakpoint
CREATE POLICY "audit_log_tenant" ON "audit_log" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "comments_tenant" ON "comments" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "idempotency_keys_tenant" ON "idempotency_keys" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "mails_tenant" ON "mails" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or workspace_id is null) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or workspace_id is null);--> statement-breakpoint
CREATE POLICY "notifications_tenant" ON "notifications" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "animal_loci_tenant" ON "animal_loci" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "animals_tenant" ON "animals" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "documents_tenant" ON "documents" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "ownership_parts_tenant" ON "ownership_parts" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "ownerships_tenant" ON "ownerships" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "photos_tenant" ON "photos" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "possible_sires_tenant" ON "possible_sires" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "tubs_tenant" ON "tubs" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "weights_tenant" ON "weights" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "combinations_tenant" ON "combinations" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "loci_tenant" ON "loci" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "species_tenant" ON "species" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "accounts_tenant" ON "accounts" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "entries_tenant" ON "entries" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "expenses_tenant" ON "expenses" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "postings_tenant" ON "postings" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "sale_splits_tenant" ON "sale_splits" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "settlement_decisions_tenant" ON "settlement_decisions" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "settlement_transfers_tenant" ON "settlement_transfers" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "settlements_tenant" ON "settlements" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "project_animals_tenant" ON "project_animals" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "project_parties_tenant" ON "project_parties" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "projects_tenant" ON "projects" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "terms_decisions_tenant" ON "terms_decisions" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "terms_versions_tenant" ON "terms_versions" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "checkouts_tenant" ON "checkouts" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "contact_events_tenant" ON "contact_events" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "contacts_tenant" ON "contacts" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or lower(email) = nullif(current_setting('moiety.email', true), '')) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "instalments_tenant" ON "instalments" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invoice_lines_tenant" ON "invoice_lines" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invoices_tenant" ON "invoices" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or link_hash = nullif(current_setting('moiety.link_hash', true), '')) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "listings_tenant" ON "listings" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "payment_service_events_tenant" ON "payment_service_events" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "payments_tenant" ON "payments" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "refunds_tenant" ON "refunds" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "clutches_tenant" ON "clutches" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "pairing_decisions_tenant" ON "pairing_decisions" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "pairing_events_tenant" ON "pairing_events" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "pairing_versions_tenant" ON "pairing_versions" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "pairings_tenant" ON "pairings" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "closed_periods_tenant" ON "closed_periods" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_tenant" ON "invitations" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or token_hash = nullif(current_setting('moiety.link_hash', true), '')) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "members_tenant" ON "members" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or user_id = nullif(current_setting('moiety.user_id', true), '')) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "parties_tenant" ON "parties" AS PERMISSIVE FOR ALL TO public USING (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid) WITH CHECK (workspace_id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "workspaces_tenant" ON "workspaces" AS PERMISSIVE FOR ALL TO public USING (id = nullif(current_setting('moiety.workspace_id', true), '')::uuid or exists (select 1 from members m where m.workspace_id = workspaces.id and m.user_id = nullif(current_setting('moiety.user_id', true), '') and m.ended_at is null) or current_setting('moiety.system', true) = 'on') WITH CHECK (id = nullif(current_setting('moiety.workspace_id', true), '')::uuid);