CREATE TABLE "security_events" (
	"id" uuid PRIMARY KEY NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"kind" text NOT NULL,
	"user_id" uuid,
	"org_id" uuid,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL
);
--> statement-breakpoint
ALTER TABLE "security_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY NOT NULL,
	"issuer" text NOT NULL,
	"subject" text NOT NULL,
	"email" text NOT NULL,
	"email_verified" boolean DEFAULT false NOT NULL,
	"name" text NOT NULL,
	"muted_mail" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "users_issuer_subject" UNIQUE("issuer","subject")
);
--> statement-breakpoint
ALTER TABLE "users" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "memberships" (
	"org_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"roles" text[] NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"ends_on" date,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "memberships_org_id_user_id_pk" PRIMARY KEY("org_id","user_id")
);
--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "organisations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"time_zone" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"row_version" integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
ALTER TABLE "organisations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "sites" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	CONSTRAINT "sites_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "sites_org_name" UNIQUE("org_id","name")
);
--> statement-breakpoint
ALTER TABLE "sites" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "relationships" (
	"id" uuid PRIMARY KEY NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"time_zone" text NOT NULL,
	"supplier_number" text,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "relationships_parties" UNIQUE("id","supplier_org_id","customer_org_id"),
	CONSTRAINT "relationships_pair" UNIQUE("supplier_org_id","customer_org_id"),
	CONSTRAINT "relationships_two_parties" CHECK (supplier_org_id <> customer_org_id)
);
--> statement-breakpoint
ALTER TABLE "relationships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "files" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"content_type" text NOT NULL,
	"size" integer NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "files_org_id" UNIQUE("org_id","id")
);
--> statement-breakpoint
ALTER TABLE "files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "calibrations" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"gauge_id" uuid,
	"standard_id" uuid,
	"certificate_number" text NOT NULL,
	"laboratory" text,
	"calibrated_on" date NOT NULL,
	"due_on" date NOT NULL,
	"found_within_limits" boolean DEFAULT true NOT NULL,
	"file_id" uuid,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "calibrations_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "calibrations_of_one_thing" CHECK ((gauge_id is null) <> (standard_id is null)),
	CONSTRAINT "calibrations_due_after" CHECK (due_on >= calibrated_on)
);
--> statement-breakpoint
ALTER TABLE "calibrations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "gauges" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"resolution" text NOT NULL,
	"unit" text NOT NULL,
	"site_id" uuid,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"archived_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "gauges_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "gauges_org_code" UNIQUE("org_id","code")
);
--> statement-breakpoint
ALTER TABLE "gauges" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reference_standards" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"name" text NOT NULL,
	"certified_value" text NOT NULL,
	"unit" text NOT NULL,
	"expanded_uncertainty" text,
	"coverage_factor" text DEFAULT '2' NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"archived_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "reference_standards_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "reference_standards_org_code" UNIQUE("org_id","code")
);
--> statement-breakpoint
ALTER TABLE "reference_standards" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "gauge_events" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"gauge_id" uuid,
	"standard_id" uuid,
	"kind" text NOT NULL,
	"happened_on" date NOT NULL,
	"words" text NOT NULL,
	"last_good_on" date,
	"calibration_id" uuid,
	"file_id" uuid,
	"suspended" integer NOT NULL,
	"stays" integer NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "gauge_events_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "gauge_events_of_one_thing" CHECK ((gauge_id is null) <> (standard_id is null))
);
--> statement-breakpoint
ALTER TABLE "gauge_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "characteristics" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"name" text NOT NULL,
	"nominal" text,
	"lower_limit" text,
	"upper_limit" text,
	"unit" text NOT NULL,
	"class" text NOT NULL,
	"process_standard_deviation" text,
	"confirmed_by_customer" boolean DEFAULT false NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"archived_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "characteristics_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "characteristics_number" UNIQUE("relationship_id","revision_id","number")
);
--> statement-breakpoint
ALTER TABLE "characteristics" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "measuring_tasks" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"characteristic_id" uuid NOT NULL,
	"gauge_id" uuid NOT NULL,
	"gauge_code" text NOT NULL,
	"gauge_name" text NOT NULL,
	"site" text,
	"process_step" text,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"archived_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "measuring_tasks_relationship_id" UNIQUE("relationship_id","id")
);
--> statement-breakpoint
ALTER TABLE "measuring_tasks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "part_revisions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"label" text NOT NULL,
	"sequence" integer NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "part_revisions_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "part_revisions_label" UNIQUE("relationship_id","part_id","label"),
	CONSTRAINT "part_revisions_sequence" UNIQUE("relationship_id","part_id","sequence")
);
--> statement-breakpoint
ALTER TABLE "part_revisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "parts" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"number" text NOT NULL,
	"supplier_number" text,
	"name" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"archived_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "parts_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "parts_relationship_number" UNIQUE("relationship_id","number")
);
--> statement-breakpoint
ALTER TABLE "parts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "house_terms" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"number" integer,
	"state" text NOT NULL,
	"clauses" jsonb NOT NULL,
	"terms" jsonb NOT NULL,
	"words" text DEFAULT '' NOT NULL,
	"text" text,
	"sha256" text,
	"created_at" timestamp (3) with time zone NOT NULL,
	"saved_at" timestamp (3) with time zone NOT NULL,
	"saved_by" uuid NOT NULL,
	"published_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "house_terms_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "house_terms_number" UNIQUE("org_id","number")
);
--> statement-breakpoint
ALTER TABLE "house_terms" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreement_comments" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"version_id" uuid NOT NULL,
	"round_id" uuid NOT NULL,
	"about" text NOT NULL,
	"clause_key" text,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"text" text NOT NULL
);
--> statement-breakpoint
ALTER TABLE "agreement_comments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreement_marks" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"version_id" uuid NOT NULL,
	"round_id" uuid NOT NULL,
	"about" text NOT NULL,
	"clause_key" text,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"sha256" text NOT NULL,
	"accepted" boolean NOT NULL
);
--> statement-breakpoint
ALTER TABLE "agreement_marks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreement_rounds" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"version_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"side" text NOT NULL,
	"state" text NOT NULL,
	"clauses" jsonb NOT NULL,
	"terms" jsonb NOT NULL,
	"effective_on" date NOT NULL,
	"comment" text DEFAULT '' NOT NULL,
	"answers_round" integer,
	"withdrawn_clauses" text[] DEFAULT '{}' NOT NULL,
	"house_terms_id" uuid,
	"house_terms_number" integer,
	"case_submission_id" uuid,
	"case_challenge_id" uuid,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"saved_at" timestamp (3) with time zone NOT NULL,
	"sent_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "agreement_rounds_relationship_id" UNIQUE("relationship_id","id")
);
--> statement-breakpoint
ALTER TABLE "agreement_rounds" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreement_signatures" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"version_id" uuid NOT NULL,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"signed_at" timestamp (3) with time zone NOT NULL,
	"authenticated_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "agreement_signatures_side" UNIQUE("relationship_id","version_id","side")
);
--> statement-breakpoint
ALTER TABLE "agreement_signatures" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreement_versions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"agreement_id" uuid NOT NULL,
	"number" integer,
	"state" text NOT NULL,
	"begun_by" text NOT NULL,
	"effective_on" date,
	"text" text,
	"sha256" text,
	"agreed_at" timestamp (3) with time zone,
	"signed_at" timestamp (3) with time zone,
	"withdrawn_at" timestamp (3) with time zone,
	"withdrawn_by" text,
	"withdrawn_reason" text,
	"created_at" timestamp (3) with time zone NOT NULL,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "agreement_versions_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "agreement_versions_number" UNIQUE("relationship_id","agreement_id","number")
);
--> statement-breakpoint
ALTER TABLE "agreement_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "agreements" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"part_id" uuid,
	"characteristic_id" uuid,
	"number" integer,
	"begun_by" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "agreements_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "agreements_number" UNIQUE("relationship_id","number")
);
--> statement-breakpoint
ALTER TABLE "agreements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "studies" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"code" text NOT NULL,
	"kind" text NOT NULL,
	"gauge_id" uuid NOT NULL,
	"gauge" jsonb NOT NULL,
	"standard_id" uuid NOT NULL,
	"state" text NOT NULL,
	"registered_at" timestamp (3) with time zone NOT NULL,
	"registered_by" uuid NOT NULL,
	"registered_beforehand" boolean NOT NULL,
	"planned_readings" integer NOT NULL,
	"plan" jsonb,
	"run_sheet_seed" integer NOT NULL,
	"slots" text[] DEFAULT '{}' NOT NULL,
	"unit" text NOT NULL,
	"measured_as" text NOT NULL,
	"collected_on" date,
	"abandoned_at" timestamp (3) with time zone,
	"abandon_reason" text,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "studies_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "studies_org_code" UNIQUE("org_id","code")
);
--> statement-breakpoint
ALTER TABLE "studies" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "study_data" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"study_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"source" text NOT NULL,
	"complete" boolean NOT NULL,
	"reason" text,
	"file_id" uuid,
	"read_as" jsonb NOT NULL,
	"standard" jsonb NOT NULL,
	"values" double precision[] NOT NULL,
	"texts" text[] NOT NULL,
	"left_out" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"appraiser" text NOT NULL,
	"taken_by" uuid[] NOT NULL,
	"collected_on" date NOT NULL,
	"sha256" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "study_data_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "study_data_revision" UNIQUE("org_id","study_id","revision")
);
--> statement-breakpoint
ALTER TABLE "study_data" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "study_evaluations" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"study_id" uuid NOT NULL,
	"data_id" uuid NOT NULL,
	"task_id" uuid NOT NULL,
	"clause_key" text NOT NULL,
	"input_text" text NOT NULL,
	"output_text" text NOT NULL,
	"output_sha256" text NOT NULL,
	"verdict" text NOT NULL,
	"engine_version" text NOT NULL,
	"engine_sha256" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "study_evaluations_one" UNIQUE("org_id","data_id","task_id","clause_key")
);
--> statement-breakpoint
ALTER TABLE "study_evaluations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "study_tasks" (
	"org_id" uuid NOT NULL,
	"study_id" uuid NOT NULL,
	"task_id" uuid NOT NULL,
	"relationship_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"attempt" integer NOT NULL,
	"criteria" jsonb NOT NULL,
	"characteristic" jsonb NOT NULL,
	CONSTRAINT "study_tasks_org_id_study_id_task_id_pk" PRIMARY KEY("org_id","study_id","task_id"),
	CONSTRAINT "study_tasks_attempt" UNIQUE("org_id","task_id","attempt")
);
--> statement-breakpoint
ALTER TABLE "study_tasks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_by_hand" (
	"org_id" uuid NOT NULL,
	"relationship_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"clause_key" text NOT NULL,
	"verdict" text NOT NULL,
	"reason" text NOT NULL,
	"file_id" uuid NOT NULL,
	"entered_by" uuid NOT NULL,
	"entered_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "submission_by_hand_org_id_submission_id_clause_key_pk" PRIMARY KEY("org_id","submission_id","clause_key")
);
--> statement-breakpoint
ALTER TABLE "submission_by_hand" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_clauses" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"position" integer NOT NULL,
	"clause_key" text NOT NULL,
	"advisory" boolean NOT NULL,
	"verdict" text NOT NULL,
	"input_text" text NOT NULL,
	"output_text" text NOT NULL,
	"output_sha256" text NOT NULL,
	"engine_version" text NOT NULL,
	"engine_sha256" text NOT NULL,
	CONSTRAINT "submission_clauses_key" UNIQUE("relationship_id","submission_id","revision","clause_key")
);
--> statement-breakpoint
ALTER TABLE "submission_clauses" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_files" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"role" text NOT NULL,
	"name" text NOT NULL,
	"content_type" text NOT NULL,
	"size" integer NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL
);
--> statement-breakpoint
ALTER TABLE "submission_files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_notes" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"text" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "submission_notes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_signatures" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"meaning" text NOT NULL,
	"revision" integer NOT NULL,
	"sha256" text NOT NULL,
	"decision_id" uuid,
	"signed_at" timestamp (3) with time zone NOT NULL,
	"authenticated_at" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "submission_signatures" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_studies" (
	"org_id" uuid NOT NULL,
	"relationship_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"study_id" uuid NOT NULL,
	"data_id" uuid NOT NULL,
	CONSTRAINT "submission_studies_org_id_submission_id_study_id_pk" PRIMARY KEY("org_id","submission_id","study_id")
);
--> statement-breakpoint
ALTER TABLE "submission_studies" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_texts" (
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision" integer NOT NULL,
	"corrects" integer,
	"text" text NOT NULL,
	"sha256" text NOT NULL,
	"frozen_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "submission_texts_relationship_id_submission_id_revision_pk" PRIMARY KEY("relationship_id","submission_id","revision"),
	CONSTRAINT "submission_texts_in_order" CHECK ((revision = 1 and corrects is null) or corrects = revision - 1)
);
--> statement-breakpoint
ALTER TABLE "submission_texts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submissions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"number" integer,
	"task_id" uuid NOT NULL,
	"part_id" uuid NOT NULL,
	"characteristic_id" uuid NOT NULL,
	"state" text NOT NULL,
	"state_since" timestamp (3) with time zone NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"sent_for_signature_at" timestamp (3) with time zone,
	"submitted_at" timestamp (3) with time zone,
	"decided_at" timestamp (3) with time zone,
	"withdrawal_reason" text,
	"criteria" text,
	"verdict" text,
	"clauses_met" integer,
	"clauses_total" integer,
	"safety" boolean NOT NULL,
	"superseded_by" uuid,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "submissions_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "submissions_number" UNIQUE("relationship_id","number"),
	CONSTRAINT "submissions_signed_number" CHECK ((submitted_at is null) = (number is null)),
	CONSTRAINT "submissions_signed_criteria" CHECK ((submitted_at is null) = (criteria is null))
);
--> statement-breakpoint
ALTER TABLE "submissions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "challenge_messages" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"challenge_id" uuid NOT NULL,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"move" text NOT NULL,
	"answer_kind" text,
	"text" text NOT NULL,
	"revision" integer,
	"agreement_id" uuid,
	"version_id" uuid,
	"what_if" text,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "challenge_messages_relationship_id" UNIQUE("relationship_id","id")
);
--> statement-breakpoint
ALTER TABLE "challenge_messages" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "challenges" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"target" jsonb NOT NULL,
	"reason_kind" text NOT NULL,
	"revision" integer NOT NULL,
	"due_on" date NOT NULL,
	"laboratory" text,
	"state" text NOT NULL,
	"opened_by" uuid NOT NULL,
	"opened_at" timestamp (3) with time zone NOT NULL,
	"answered_at" timestamp (3) with time zone,
	"closed_by" uuid,
	"closed_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "challenges_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "challenges_number" UNIQUE("relationship_id","submission_id","number")
);
--> statement-breakpoint
ALTER TABLE "challenges" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "condition_reports" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"condition_id" uuid NOT NULL,
	"move" text NOT NULL,
	"side" text NOT NULL,
	"user_id" uuid NOT NULL,
	"text" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "condition_reports_relationship_id" UNIQUE("relationship_id","id")
);
--> statement-breakpoint
ALTER TABLE "condition_reports" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "conditions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"decision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"text" text NOT NULL,
	"due_on" date NOT NULL,
	"owner" text NOT NULL,
	"follow_up" text NOT NULL,
	"state" text NOT NULL,
	"confirmed_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "conditions_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "conditions_number" UNIQUE("relationship_id","decision_id","number"),
	CONSTRAINT "conditions_confirmed" CHECK ((state = 'confirmed') = (confirmed_at is not null))
);
--> statement-breakpoint
ALTER TABLE "conditions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "decisions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"state" text NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"revision" integer NOT NULL,
	"decided_by" uuid NOT NULL,
	"decided_at" timestamp (3) with time zone NOT NULL,
	"second_by" uuid,
	"second_at" timestamp (3) with time zone,
	"sent_back_reason" text,
	"other_side_by" uuid,
	"other_side_at" timestamp (3) with time zone,
	"declined_reason" text,
	CONSTRAINT "decisions_relationship_id" UNIQUE("relationship_id","id")
);
--> statement-breakpoint
ALTER TABLE "decisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "review_files" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"message_id" uuid,
	"report_id" uuid,
	"side" text NOT NULL,
	"name" text NOT NULL,
	"content_type" text NOT NULL,
	"size" integer NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL,
	CONSTRAINT "review_files_of_one" CHECK (num_nonnulls(message_id, report_id) = 1)
);
--> statement-breakpoint
ALTER TABLE "review_files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "request_answers" (
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"request_id" uuid NOT NULL,
	"task_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	CONSTRAINT "request_answers_relationship_id_request_id_submission_id_pk" PRIMARY KEY("relationship_id","request_id","submission_id")
);
--> statement-breakpoint
ALTER TABLE "request_answers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "request_tasks" (
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"request_id" uuid NOT NULL,
	"task_id" uuid NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "request_tasks_relationship_id_request_id_task_id_pk" PRIMARY KEY("relationship_id","request_id","task_id")
);
--> statement-breakpoint
ALTER TABLE "request_tasks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "requests" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"occasion" text NOT NULL,
	"words" text NOT NULL,
	"due_on" date NOT NULL,
	"asked_by" uuid NOT NULL,
	"asked_at" timestamp (3) with time zone NOT NULL,
	"withdrawn_by" uuid,
	"withdrawn_at" timestamp (3) with time zone,
	"withdrawal_reason" text,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "requests_relationship_id" UNIQUE("relationship_id","id"),
	CONSTRAINT "requests_number" UNIQUE("relationship_id","number"),
	CONSTRAINT "requests_withdrawn_whole" CHECK ((withdrawn_at is null) = (withdrawn_by is null) and (withdrawn_at is null) = (withdrawal_reason is null))
);
--> statement-breakpoint
ALTER TABLE "requests" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reminders" (
	"org_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"day" date NOT NULL,
	"told_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "reminders_org_id_kind_subject_id_day_pk" PRIMARY KEY("org_id","kind","subject_id","day")
);
--> statement-breakpoint
ALTER TABLE "reminders" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "carry_overs" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"characteristic_id" uuid NOT NULL,
	"carried_by" uuid NOT NULL,
	"carried_at" timestamp (3) with time zone NOT NULL,
	"authenticated_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "carry_overs_once" UNIQUE("relationship_id","submission_id","revision_id")
);
--> statement-breakpoint
ALTER TABLE "carry_overs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reinstatements" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"words" text NOT NULL,
	"reinstated_by" uuid NOT NULL,
	"reinstated_at" timestamp (3) with time zone NOT NULL,
	"authenticated_at" timestamp (3) with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "reinstatements" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "standing_calibrations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"of" text NOT NULL,
	"thing_id" uuid NOT NULL,
	"code" text NOT NULL,
	"calibration_id" uuid NOT NULL,
	"calibrated_on" date NOT NULL,
	"due_on" date NOT NULL,
	"entered_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "standing_calibrations_once" UNIQUE("relationship_id","submission_id","calibration_id")
);
--> statement-breakpoint
ALTER TABLE "standing_calibrations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "standing_events" (
	"id" uuid PRIMARY KEY NOT NULL,
	"relationship_id" uuid NOT NULL,
	"supplier_org_id" uuid NOT NULL,
	"customer_org_id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"of" text NOT NULL,
	"thing_id" uuid NOT NULL,
	"code" text NOT NULL,
	"event_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"happened_on" date NOT NULL,
	"in_doubt_since" date,
	"words" text NOT NULL,
	"entered_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "standing_events_once" UNIQUE("relationship_id","submission_id","event_id")
);
--> statement-breakpoint
ALTER TABLE "standing_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "record_events" (
	"chain_id" uuid NOT NULL,
	"org_id" uuid,
	"supplier_org_id" uuid,
	"customer_org_id" uuid,
	"sequence" integer NOT NULL,
	"at" timestamp (3) with time zone NOT NULL,
	"type" text NOT NULL,
	"actor_user_id" uuid,
	"actor_org_id" uuid,
	"subject_type" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"task_id" uuid,
	"text" text NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "record_events_chain_id_sequence_pk" PRIMARY KEY("chain_id","sequence"),
	CONSTRAINT "record_events_kind" CHECK ((org_id is not null) <> (supplier_org_id is not null and customer_org_id is not null) and (org_id is null or org_id = chain_id))
);
--> statement-breakpoint
ALTER TABLE "record_events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "record_heads" (
	"chain_id" uuid NOT NULL,
	"org_id" uuid,
	"supplier_org_id" uuid,
	"customer_org_id" uuid,
	"sequence" integer NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "record_heads_chain_id_pk" PRIMARY KEY("chain_id"),
	CONSTRAINT "record_heads_kind" CHECK ((org_id is not null) <> (supplier_org_id is not null and customer_org_id is not null) and (org_id is null or org_id = chain_id))
);
--> statement-breakpoint
ALTER TABLE "record_heads" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "messages" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"side" text NOT NULL,
	"kind" text NOT NULL,
	"subject" text NOT NULL,
	"body" text NOT NULL,
	"link" text NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"read_at" timestamp (3) with time zone,
	CONSTRAINT "messages_org_id" UNIQUE("org_id","id")
);
--> statement-breakpoint
ALTER TABLE "messages" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "outbox" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"message_id" uuid NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"next_attempt_at" timestamp (3) with time zone NOT NULL,
	"sent_at" timestamp (3) with time zone,
	"last_error" text,
	CONSTRAINT "outbox_message" UNIQUE("org_id","message_id")
);
--> statement-breakpoint
ALTER TABLE "outbox" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sites" ADD CONSTRAINT "sites_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "relationships" ADD CONSTRAINT "relationships_supplier_fk" FOREIGN KEY ("supplier_org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "relationships" ADD CONSTRAINT "relationships_customer_fk" FOREIGN KEY ("customer_org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_gauge_fk" FOREIGN KEY ("org_id","gauge_id") REFERENCES "public"."gauges"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_standard_fk" FOREIGN KEY ("org_id","standard_id") REFERENCES "public"."reference_standards"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calibrations" ADD CONSTRAINT "calibrations_file_fk" FOREIGN KEY ("org_id","file_id") REFERENCES "public"."files"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauges" ADD CONSTRAINT "gauges_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauges" ADD CONSTRAINT "gauges_site_fk" FOREIGN KEY ("org_id","site_id") REFERENCES "public"."sites"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reference_standards" ADD CONSTRAINT "reference_standards_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_events" ADD CONSTRAINT "gauge_events_gauge_fk" FOREIGN KEY ("org_id","gauge_id") REFERENCES "public"."gauges"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_events" ADD CONSTRAINT "gauge_events_standard_fk" FOREIGN KEY ("org_id","standard_id") REFERENCES "public"."reference_standards"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_events" ADD CONSTRAINT "gauge_events_calibration_fk" FOREIGN KEY ("org_id","calibration_id") REFERENCES "public"."calibrations"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_events" ADD CONSTRAINT "gauge_events_file_fk" FOREIGN KEY ("org_id","file_id") REFERENCES "public"."files"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "characteristics" ADD CONSTRAINT "characteristics_part_fk" FOREIGN KEY ("relationship_id","part_id") REFERENCES "public"."parts"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "characteristics" ADD CONSTRAINT "characteristics_revision_fk" FOREIGN KEY ("relationship_id","revision_id") REFERENCES "public"."part_revisions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "characteristics" ADD CONSTRAINT "characteristics_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measuring_tasks" ADD CONSTRAINT "measuring_tasks_characteristic_fk" FOREIGN KEY ("relationship_id","characteristic_id") REFERENCES "public"."characteristics"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measuring_tasks" ADD CONSTRAINT "measuring_tasks_part_fk" FOREIGN KEY ("relationship_id","part_id") REFERENCES "public"."parts"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measuring_tasks" ADD CONSTRAINT "measuring_tasks_gauge_fk" FOREIGN KEY ("supplier_org_id","gauge_id") REFERENCES "public"."gauges"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measuring_tasks" ADD CONSTRAINT "measuring_tasks_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_revisions" ADD CONSTRAINT "part_revisions_part_fk" FOREIGN KEY ("relationship_id","part_id") REFERENCES "public"."parts"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_revisions" ADD CONSTRAINT "part_revisions_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "parts" ADD CONSTRAINT "parts_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "house_terms" ADD CONSTRAINT "house_terms_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_comments" ADD CONSTRAINT "agreement_comments_round_fk" FOREIGN KEY ("relationship_id","round_id") REFERENCES "public"."agreement_rounds"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_comments" ADD CONSTRAINT "agreement_comments_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_marks" ADD CONSTRAINT "agreement_marks_round_fk" FOREIGN KEY ("relationship_id","round_id") REFERENCES "public"."agreement_rounds"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_marks" ADD CONSTRAINT "agreement_marks_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_rounds" ADD CONSTRAINT "agreement_rounds_version_fk" FOREIGN KEY ("relationship_id","version_id") REFERENCES "public"."agreement_versions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_rounds" ADD CONSTRAINT "agreement_rounds_house_terms_fk" FOREIGN KEY ("customer_org_id","house_terms_id") REFERENCES "public"."house_terms"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_rounds" ADD CONSTRAINT "agreement_rounds_case_submission_fk" FOREIGN KEY ("relationship_id","case_submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_rounds" ADD CONSTRAINT "agreement_rounds_case_challenge_fk" FOREIGN KEY ("relationship_id","case_challenge_id") REFERENCES "public"."challenges"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_rounds" ADD CONSTRAINT "agreement_rounds_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_signatures" ADD CONSTRAINT "agreement_signatures_version_fk" FOREIGN KEY ("relationship_id","version_id") REFERENCES "public"."agreement_versions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_signatures" ADD CONSTRAINT "agreement_signatures_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_versions" ADD CONSTRAINT "agreement_versions_agreement_fk" FOREIGN KEY ("relationship_id","agreement_id") REFERENCES "public"."agreements"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreement_versions" ADD CONSTRAINT "agreement_versions_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreements" ADD CONSTRAINT "agreements_part_fk" FOREIGN KEY ("relationship_id","part_id") REFERENCES "public"."parts"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreements" ADD CONSTRAINT "agreements_characteristic_fk" FOREIGN KEY ("relationship_id","characteristic_id") REFERENCES "public"."characteristics"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreements" ADD CONSTRAINT "agreements_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "studies" ADD CONSTRAINT "studies_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "studies" ADD CONSTRAINT "studies_gauge_fk" FOREIGN KEY ("org_id","gauge_id") REFERENCES "public"."gauges"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "studies" ADD CONSTRAINT "studies_standard_fk" FOREIGN KEY ("org_id","standard_id") REFERENCES "public"."reference_standards"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_data" ADD CONSTRAINT "study_data_study_fk" FOREIGN KEY ("org_id","study_id") REFERENCES "public"."studies"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_data" ADD CONSTRAINT "study_data_file_fk" FOREIGN KEY ("org_id","file_id") REFERENCES "public"."files"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_evaluations" ADD CONSTRAINT "study_evaluations_study_fk" FOREIGN KEY ("org_id","study_id") REFERENCES "public"."studies"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_evaluations" ADD CONSTRAINT "study_evaluations_data_fk" FOREIGN KEY ("org_id","data_id") REFERENCES "public"."study_data"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_tasks" ADD CONSTRAINT "study_tasks_study_fk" FOREIGN KEY ("org_id","study_id") REFERENCES "public"."studies"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_tasks" ADD CONSTRAINT "study_tasks_task_fk" FOREIGN KEY ("relationship_id","task_id") REFERENCES "public"."measuring_tasks"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "study_tasks" ADD CONSTRAINT "study_tasks_relationship_fk" FOREIGN KEY ("relationship_id","org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_by_hand" ADD CONSTRAINT "submission_by_hand_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_by_hand" ADD CONSTRAINT "submission_by_hand_file_fk" FOREIGN KEY ("org_id","file_id") REFERENCES "public"."files"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_clauses" ADD CONSTRAINT "submission_clauses_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_clauses" ADD CONSTRAINT "submission_clauses_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_files" ADD CONSTRAINT "submission_files_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_files" ADD CONSTRAINT "submission_files_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_notes" ADD CONSTRAINT "submission_notes_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_signatures" ADD CONSTRAINT "submission_signatures_decision_fk" FOREIGN KEY ("relationship_id","decision_id") REFERENCES "public"."decisions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_signatures" ADD CONSTRAINT "submission_signatures_text_fk" FOREIGN KEY ("relationship_id","submission_id","revision") REFERENCES "public"."submission_texts"("relationship_id","submission_id","revision") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_signatures" ADD CONSTRAINT "submission_signatures_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_studies" ADD CONSTRAINT "submission_studies_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_studies" ADD CONSTRAINT "submission_studies_study_fk" FOREIGN KEY ("org_id","study_id") REFERENCES "public"."studies"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_studies" ADD CONSTRAINT "submission_studies_data_fk" FOREIGN KEY ("org_id","data_id") REFERENCES "public"."study_data"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_texts" ADD CONSTRAINT "submission_texts_corrects_fk" FOREIGN KEY ("relationship_id","submission_id","corrects") REFERENCES "public"."submission_texts"("relationship_id","submission_id","revision") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_texts" ADD CONSTRAINT "submission_texts_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_texts" ADD CONSTRAINT "submission_texts_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_task_fk" FOREIGN KEY ("relationship_id","task_id") REFERENCES "public"."measuring_tasks"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "challenge_messages" ADD CONSTRAINT "challenge_messages_challenge_fk" FOREIGN KEY ("relationship_id","challenge_id") REFERENCES "public"."challenges"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "challenge_messages" ADD CONSTRAINT "challenge_messages_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "challenges" ADD CONSTRAINT "challenges_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "challenges" ADD CONSTRAINT "challenges_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "condition_reports" ADD CONSTRAINT "condition_reports_condition_fk" FOREIGN KEY ("relationship_id","condition_id") REFERENCES "public"."conditions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "condition_reports" ADD CONSTRAINT "condition_reports_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conditions" ADD CONSTRAINT "conditions_decision_fk" FOREIGN KEY ("relationship_id","decision_id") REFERENCES "public"."decisions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conditions" ADD CONSTRAINT "conditions_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conditions" ADD CONSTRAINT "conditions_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_files" ADD CONSTRAINT "review_files_message_fk" FOREIGN KEY ("relationship_id","message_id") REFERENCES "public"."challenge_messages"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_files" ADD CONSTRAINT "review_files_report_fk" FOREIGN KEY ("relationship_id","report_id") REFERENCES "public"."condition_reports"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_files" ADD CONSTRAINT "review_files_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "review_files" ADD CONSTRAINT "review_files_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_answers" ADD CONSTRAINT "request_answers_task_fk" FOREIGN KEY ("relationship_id","request_id","task_id") REFERENCES "public"."request_tasks"("relationship_id","request_id","task_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_answers" ADD CONSTRAINT "request_answers_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_answers" ADD CONSTRAINT "request_answers_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_tasks" ADD CONSTRAINT "request_tasks_request_fk" FOREIGN KEY ("relationship_id","request_id") REFERENCES "public"."requests"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_tasks" ADD CONSTRAINT "request_tasks_task_fk" FOREIGN KEY ("relationship_id","task_id") REFERENCES "public"."measuring_tasks"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "request_tasks" ADD CONSTRAINT "request_tasks_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "requests" ADD CONSTRAINT "requests_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reminders" ADD CONSTRAINT "reminders_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "carry_overs" ADD CONSTRAINT "carry_overs_revision_fk" FOREIGN KEY ("relationship_id","revision_id") REFERENCES "public"."part_revisions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "carry_overs" ADD CONSTRAINT "carry_overs_characteristic_fk" FOREIGN KEY ("relationship_id","characteristic_id") REFERENCES "public"."characteristics"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "carry_overs" ADD CONSTRAINT "carry_overs_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "carry_overs" ADD CONSTRAINT "carry_overs_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reinstatements" ADD CONSTRAINT "reinstatements_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reinstatements" ADD CONSTRAINT "reinstatements_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_calibrations" ADD CONSTRAINT "standing_calibrations_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_calibrations" ADD CONSTRAINT "standing_calibrations_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_events" ADD CONSTRAINT "standing_events_submission_fk" FOREIGN KEY ("relationship_id","submission_id") REFERENCES "public"."submissions"("relationship_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "standing_events" ADD CONSTRAINT "standing_events_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "record_events" ADD CONSTRAINT "record_events_relationship_fk" FOREIGN KEY ("chain_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "record_heads" ADD CONSTRAINT "record_heads_relationship_fk" FOREIGN KEY ("chain_id","supplier_org_id","customer_org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_user_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_message_fk" FOREIGN KEY ("org_id","message_id") REFERENCES "public"."messages"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "relationships_customer" ON "relationships" USING btree ("customer_org_id");--> statement-breakpoint
CREATE INDEX "calibrations_gauge" ON "calibrations" USING btree ("org_id","gauge_id","calibrated_on");--> statement-breakpoint
CREATE INDEX "calibrations_standard" ON "calibrations" USING btree ("org_id","standard_id","calibrated_on");--> statement-breakpoint
CREATE INDEX "gauge_events_gauge" ON "gauge_events" USING btree ("org_id","gauge_id","happened_on");--> statement-breakpoint
CREATE INDEX "gauge_events_standard" ON "gauge_events" USING btree ("org_id","standard_id","happened_on");--> statement-breakpoint
CREATE INDEX "characteristics_part" ON "characteristics" USING btree ("relationship_id","part_id");--> statement-breakpoint
CREATE INDEX "measuring_tasks_characteristic" ON "measuring_tasks" USING btree ("relationship_id","characteristic_id");--> statement-breakpoint
CREATE INDEX "measuring_tasks_gauge" ON "measuring_tasks" USING btree ("supplier_org_id","gauge_id");--> statement-breakpoint
CREATE INDEX "parts_supplier" ON "parts" USING btree ("supplier_org_id","number");--> statement-breakpoint
CREATE INDEX "parts_customer" ON "parts" USING btree ("customer_org_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "house_terms_one_draft" ON "house_terms" USING btree ("org_id") WHERE state = 'draft';--> statement-breakpoint
CREATE INDEX "agreement_comments_version" ON "agreement_comments" USING btree ("relationship_id","version_id","at");--> statement-breakpoint
CREATE INDEX "agreement_marks_version" ON "agreement_marks" USING btree ("relationship_id","version_id","at");--> statement-breakpoint
CREATE UNIQUE INDEX "agreement_rounds_number" ON "agreement_rounds" USING btree ("relationship_id","version_id","number") WHERE state <> 'draft';--> statement-breakpoint
CREATE UNIQUE INDEX "agreement_rounds_one_draft" ON "agreement_rounds" USING btree ("relationship_id","version_id","side") WHERE state = 'draft';--> statement-breakpoint
CREATE UNIQUE INDEX "agreement_versions_one_open" ON "agreement_versions" USING btree ("relationship_id","agreement_id") WHERE state in ('proposed', 'countered');--> statement-breakpoint
CREATE UNIQUE INDEX "agreement_versions_one_draft" ON "agreement_versions" USING btree ("relationship_id","agreement_id","begun_by") WHERE state = 'draft';--> statement-breakpoint
CREATE INDEX "agreement_versions_supplier" ON "agreement_versions" USING btree ("supplier_org_id","state");--> statement-breakpoint
CREATE INDEX "agreement_versions_customer" ON "agreement_versions" USING btree ("customer_org_id","state");--> statement-breakpoint
CREATE UNIQUE INDEX "agreements_scope" ON "agreements" USING btree ("relationship_id",coalesce(part_id, '00000000-0000-0000-0000-000000000000'::uuid),coalesce(characteristic_id, '00000000-0000-0000-0000-000000000000'::uuid)) WHERE number is not null;--> statement-breakpoint
CREATE UNIQUE INDEX "agreements_draft_scope" ON "agreements" USING btree ("relationship_id","begun_by",coalesce(part_id, '00000000-0000-0000-0000-000000000000'::uuid),coalesce(characteristic_id, '00000000-0000-0000-0000-000000000000'::uuid)) WHERE number is null;--> statement-breakpoint
CREATE INDEX "agreements_supplier" ON "agreements" USING btree ("supplier_org_id","number");--> statement-breakpoint
CREATE INDEX "agreements_customer" ON "agreements" USING btree ("customer_org_id","number");--> statement-breakpoint
CREATE INDEX "studies_org_state" ON "studies" USING btree ("org_id","state","registered_at");--> statement-breakpoint
CREATE INDEX "study_evaluations_study" ON "study_evaluations" USING btree ("org_id","study_id");--> statement-breakpoint
CREATE INDEX "submission_files_submission" ON "submission_files" USING btree ("relationship_id","submission_id","revision");--> statement-breakpoint
CREATE INDEX "submission_notes_submission" ON "submission_notes" USING btree ("org_id","submission_id","created_at");--> statement-breakpoint
CREATE INDEX "submission_signatures_submission" ON "submission_signatures" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE UNIQUE INDEX "submissions_one_draft" ON "submissions" USING btree ("relationship_id","task_id") WHERE state in ('draft', 'for-signature');--> statement-breakpoint
CREATE INDEX "submissions_supplier_state" ON "submissions" USING btree ("supplier_org_id","state","state_since");--> statement-breakpoint
CREATE INDEX "submissions_customer_state" ON "submissions" USING btree ("customer_org_id","state","state_since");--> statement-breakpoint
CREATE INDEX "submissions_task" ON "submissions" USING btree ("relationship_id","task_id");--> statement-breakpoint
CREATE INDEX "challenge_messages_challenge" ON "challenge_messages" USING btree ("relationship_id","challenge_id","created_at");--> statement-breakpoint
CREATE INDEX "condition_reports_condition" ON "condition_reports" USING btree ("relationship_id","condition_id","created_at");--> statement-breakpoint
CREATE INDEX "conditions_submission" ON "conditions" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "decisions_submission" ON "decisions" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE UNIQUE INDEX "decisions_one_final" ON "decisions" USING btree ("relationship_id","submission_id") WHERE state = 'final';--> statement-breakpoint
CREATE UNIQUE INDEX "decisions_one_proposed" ON "decisions" USING btree ("relationship_id","submission_id") WHERE state in ('awaiting-second-person', 'awaiting-other-side');--> statement-breakpoint
CREATE INDEX "review_files_submission" ON "review_files" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "request_answers_submission" ON "request_answers" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "request_tasks_task" ON "request_tasks" USING btree ("relationship_id","task_id");--> statement-breakpoint
CREATE INDEX "requests_supplier_due" ON "requests" USING btree ("supplier_org_id","due_on");--> statement-breakpoint
CREATE INDEX "requests_customer_due" ON "requests" USING btree ("customer_org_id","due_on");--> statement-breakpoint
CREATE INDEX "carry_overs_characteristic" ON "carry_overs" USING btree ("relationship_id","characteristic_id");--> statement-breakpoint
CREATE INDEX "carry_overs_submission" ON "carry_overs" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "reinstatements_submission" ON "reinstatements" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "standing_calibrations_submission" ON "standing_calibrations" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "standing_events_submission" ON "standing_events" USING btree ("relationship_id","submission_id");--> statement-breakpoint
CREATE INDEX "record_events_subject" ON "record_events" USING btree ("chain_id","subject_type","subject_id");--> statement-breakpoint
CREATE INDEX "messages_person" ON "messages" USING btree ("org_id","user_id","created_at");--> statement-breakpoint
CREATE INDEX "outbox_due" ON "outbox" USING btree ("next_attempt_at") WHERE sent_at is null;--> statement-breakpoint
CREATE POLICY "security_events_append" ON "security_events" AS PERMISSIVE FOR INSERT TO "evenrule_app" WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "users_self" ON "users" AS PERMISSIVE FOR ALL TO "evenrule_app" USING (id = nullif(current_setting('app.user_id', true), '')::uuid) WITH CHECK (id = nullif(current_setting('app.user_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "users_system" ON "users" AS PERMISSIVE FOR SELECT TO "evenrule_system" USING (true);--> statement-breakpoint
CREATE POLICY "memberships_owner" ON "memberships" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisations_self" ON "organisations" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "organisations_partners" ON "organisations" AS PERMISSIVE FOR SELECT TO "evenrule_app", "evenrule_system" USING (exists (select 1 from relationships r where r.supplier_org_id = organisations.id or r.customer_org_id = organisations.id));--> statement-breakpoint
CREATE POLICY "sites_owner" ON "sites" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "relationships_parties" ON "relationships" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "files_owner" ON "files" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "calibrations_owner" ON "calibrations" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "gauges_owner" ON "gauges" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "reference_standards_owner" ON "reference_standards" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "gauge_events_owner" ON "gauge_events" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "characteristics_parties" ON "characteristics" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "measuring_tasks_parties" ON "measuring_tasks" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "part_revisions_parties" ON "part_revisions" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "parts_parties" ON "parts" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "house_terms_owner" ON "house_terms" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "house_terms_suppliers" ON "house_terms" AS PERMISSIVE FOR SELECT TO "evenrule_app" USING (state = 'published' and exists (select 1 from relationships r where r.customer_org_id = house_terms.org_id and r.supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "house_terms_published_stay" ON "house_terms" AS RESTRICTIVE FOR DELETE TO "evenrule_app", "evenrule_system" USING (state = 'draft');--> statement-breakpoint
CREATE POLICY "house_terms_published_unchanged" ON "house_terms" AS RESTRICTIVE FOR UPDATE TO "evenrule_app" USING (state = 'draft') WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "agreement_comments_parties" ON "agreement_comments" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreement_comments_own_side" ON "agreement_comments" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreement_comments_sent_rounds" ON "agreement_comments" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (exists (select 1 from agreement_rounds r where r.relationship_id = agreement_comments.relationship_id and r.id = agreement_comments.round_id and r.state <> 'draft'));--> statement-breakpoint
CREATE POLICY "agreement_marks_parties" ON "agreement_marks" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreement_marks_own_side" ON "agreement_marks" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreement_marks_sent_rounds" ON "agreement_marks" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (exists (select 1 from agreement_rounds r where r.relationship_id = agreement_marks.relationship_id and r.id = agreement_marks.round_id and r.state <> 'draft'));--> statement-breakpoint
CREATE POLICY "agreement_rounds_parties" ON "agreement_rounds" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreement_rounds_drafts" ON "agreement_rounds" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (state <> 'draft' or ((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid))) WITH CHECK (state <> 'draft' or ((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreement_rounds_sent_stay" ON "agreement_rounds" AS RESTRICTIVE FOR DELETE TO "evenrule_app", "evenrule_system" USING (state = 'draft');--> statement-breakpoint
CREATE POLICY "agreement_signatures_parties" ON "agreement_signatures" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreement_signatures_own_side" ON "agreement_signatures" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreement_versions_parties" ON "agreement_versions" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreement_versions_drafts" ON "agreement_versions" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (state <> 'draft' or ((begun_by = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (begun_by = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid))) WITH CHECK (state <> 'draft' or ((begun_by = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (begun_by = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreement_versions_sent_stay" ON "agreement_versions" AS RESTRICTIVE FOR DELETE TO "evenrule_app", "evenrule_system" USING (state = 'draft');--> statement-breakpoint
CREATE POLICY "agreement_versions_signed_stay" ON "agreement_versions" AS RESTRICTIVE FOR UPDATE TO "evenrule_app" USING (state <> 'signed') WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "agreements_parties" ON "agreements" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "agreements_drafts" ON "agreements" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (number is not null or ((begun_by = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (begun_by = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid))) WITH CHECK (number is not null or ((begun_by = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (begun_by = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "agreements_sent_stay" ON "agreements" AS RESTRICTIVE FOR DELETE TO "evenrule_app", "evenrule_system" USING (number is null);--> statement-breakpoint
CREATE POLICY "studies_owner" ON "studies" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "study_data_owner" ON "study_data" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "study_evaluations_owner" ON "study_evaluations" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "study_tasks_owner" ON "study_tasks" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submission_by_hand_owner" ON "submission_by_hand" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submission_clauses_parties" ON "submission_clauses" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "submission_clauses_visible" ON "submission_clauses" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "submission_clauses_frozen" ON "submission_clauses" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid and not exists (select 1 from submission_texts f where f.submission_id = submission_clauses.submission_id and f.revision >= submission_clauses.revision));--> statement-breakpoint
CREATE POLICY "submission_files_parties" ON "submission_files" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "submission_files_visible" ON "submission_files" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "submission_files_frozen" ON "submission_files" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid and not exists (select 1 from submission_texts f where f.submission_id = submission_files.submission_id and f.revision >= submission_files.revision));--> statement-breakpoint
CREATE POLICY "submission_notes_owner" ON "submission_notes" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submission_signatures_parties" ON "submission_signatures" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "submission_signatures_visible" ON "submission_signatures" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "submission_signatures_own_side" ON "submission_signatures" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "submission_signatures_decided" ON "submission_signatures" AS RESTRICTIVE FOR SELECT TO "evenrule_app", "evenrule_system" USING (decision_id is null or exists (select 1 from decisions d where d.id = decision_id));--> statement-breakpoint
CREATE POLICY "submission_studies_owner" ON "submission_studies" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submission_texts_parties" ON "submission_texts" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "submission_texts_visible" ON "submission_texts" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "submission_texts_by_supplier" ON "submission_texts" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid and exists (select 1 from submissions s where s.id = submission_id and s.state = case when revision = 1 then 'for-signature' else 'challenged' end));--> statement-breakpoint
CREATE POLICY "submissions_parties" ON "submissions" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "submissions_by_supplier" ON "submissions" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submissions_drafts" ON "submissions" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (submitted_at is not null or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (submitted_at is not null or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "challenge_messages_parties" ON "challenge_messages" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "challenge_messages_own_side" ON "challenge_messages" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "challenges_parties" ON "challenges" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "challenges_by_customer" ON "challenges" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "condition_reports_parties" ON "condition_reports" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "condition_reports_visible" ON "condition_reports" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from conditions c where c.id = condition_id)) WITH CHECK (exists (select 1 from conditions c where c.id = condition_id));--> statement-breakpoint
CREATE POLICY "condition_reports_own_side" ON "condition_reports" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "conditions_parties" ON "conditions" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "conditions_visible" ON "conditions" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from decisions d where d.id = decision_id)) WITH CHECK (exists (select 1 from decisions d where d.id = decision_id));--> statement-breakpoint
CREATE POLICY "conditions_by_customer" ON "conditions" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "conditions_changed" ON "conditions" AS RESTRICTIVE FOR UPDATE TO "evenrule_app", "evenrule_system" USING (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid or (owner = 'supplier' and state = 'open')) WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid or (owner = 'supplier' and state = 'reported'));--> statement-breakpoint
CREATE POLICY "decisions_parties" ON "decisions" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "decisions_by_customer" ON "decisions" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "decisions_changed" ON "decisions" AS RESTRICTIVE FOR UPDATE TO "evenrule_app", "evenrule_system" USING (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid or state = 'awaiting-other-side') WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid or (other_side_by is not null and state in ('final', 'withdrawn')));--> statement-breakpoint
CREATE POLICY "decisions_visible" ON "decisions" AS RESTRICTIVE FOR SELECT TO "evenrule_app", "evenrule_system" USING (state in ('final', 'awaiting-other-side') or other_side_by is not null or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "review_files_parties" ON "review_files" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "review_files_own_side" ON "review_files" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (((side = 'supplier' and supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid) or (side = 'customer' and customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "request_answers_parties" ON "request_answers" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "request_answers_by_supplier" ON "request_answers" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "request_tasks_parties" ON "request_tasks" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "request_tasks_by_customer" ON "request_tasks" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "requests_parties" ON "requests" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "requests_by_customer" ON "requests" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "requests_changed_by_customer" ON "requests" AS RESTRICTIVE FOR UPDATE TO "evenrule_app", "evenrule_system" USING (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "reminders_owner" ON "reminders" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "carry_overs_parties" ON "carry_overs" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "carry_overs_visible" ON "carry_overs" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "carry_overs_writer" ON "carry_overs" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "reinstatements_parties" ON "reinstatements" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "reinstatements_visible" ON "reinstatements" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "reinstatements_writer" ON "reinstatements" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "standing_calibrations_parties" ON "standing_calibrations" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "standing_calibrations_visible" ON "standing_calibrations" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "standing_calibrations_writer" ON "standing_calibrations" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "standing_events_parties" ON "standing_events" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)) WITH CHECK ((supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "standing_events_visible" ON "standing_events" AS RESTRICTIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (exists (select 1 from submissions s where s.id = submission_id)) WITH CHECK (exists (select 1 from submissions s where s.id = submission_id));--> statement-breakpoint
CREATE POLICY "standing_events_writer" ON "standing_events" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "record_events_visible" ON "record_events" AS PERMISSIVE FOR ALL TO "evenrule_app" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "record_heads_visible" ON "record_heads" AS PERMISSIVE FOR ALL TO "evenrule_app" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid or supplier_org_id = nullif(current_setting('app.org_id', true), '')::uuid or customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "messages_own" ON "messages" AS PERMISSIVE FOR SELECT TO "evenrule_app" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid and user_id = nullif(current_setting('app.user_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "messages_read" ON "messages" AS PERMISSIVE FOR UPDATE TO "evenrule_app" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid and user_id = nullif(current_setting('app.user_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid and user_id = nullif(current_setting('app.user_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "messages_system" ON "messages" AS PERMISSIVE FOR SELECT TO "evenrule_system" USING (true);--> statement-breakpoint
CREATE POLICY "outbox_system" ON "outbox" AS PERMISSIVE FOR ALL TO "evenrule_system" USING (true) WITH CHECK (true);