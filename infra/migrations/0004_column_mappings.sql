CREATE TABLE "column_mappings" (
	"org_id" uuid NOT NULL,
	"purpose" text NOT NULL,
	"signature" text NOT NULL,
	"mapping" jsonb NOT NULL,
	"updated_at" timestamp (3) with time zone NOT NULL,
	"updated_by" uuid NOT NULL,
	CONSTRAINT "column_mappings_pk" PRIMARY KEY("org_id","purpose","signature")
);
--> statement-breakpoint
ALTER TABLE "column_mappings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "column_mappings" ADD CONSTRAINT "column_mappings_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE POLICY "column_mappings_owner" ON "column_mappings" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);