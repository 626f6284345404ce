CREATE TABLE "imports" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"side" text NOT NULL,
	"kind" text NOT NULL,
	"mode" text NOT NULL,
	"state" text NOT NULL,
	"file_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"input" jsonb NOT NULL,
	"basis" text NOT NULL,
	"counts" jsonb NOT NULL,
	"left_out" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"done" integer DEFAULT 0 NOT NULL,
	"total" integer NOT NULL,
	"failure" jsonb,
	"alive_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"created_by" uuid NOT NULL,
	"finished_at" timestamp (3) with time zone,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "imports_org_id" UNIQUE("org_id","id")
);
--> statement-breakpoint
ALTER TABLE "imports" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_file_fk" FOREIGN KEY ("org_id","file_id") REFERENCES "public"."files"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "imports_org_created" ON "imports" USING btree ("org_id","side","created_at");--> statement-breakpoint
CREATE POLICY "imports_owner" ON "imports" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);