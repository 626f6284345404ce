CREATE TABLE "invitations" (
	"org_id" uuid NOT NULL,
	"id" uuid PRIMARY KEY NOT NULL,
	"kind" text NOT NULL,
	"side" text NOT NULL,
	"email" text NOT NULL,
	"supplier_name" text,
	"supplier_number" text,
	"roles" text[] DEFAULT '{}' NOT NULL,
	"ends_on" date,
	"message" text NOT NULL,
	"invited_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone NOT NULL,
	"nonce" text NOT NULL,
	"token_hash" text NOT NULL,
	"sent_at" timestamp (3) with time zone NOT NULL,
	"expires_on" date NOT NULL,
	"accepted_at" timestamp (3) with time zone,
	"accepted_by" uuid,
	"relationship_id" uuid,
	"supplier_org_id" uuid,
	"revoked_at" timestamp (3) with time zone,
	"revoked_by" uuid,
	"row_version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "invitations_org_id" UNIQUE("org_id","id"),
	CONSTRAINT "invitations_one_end" CHECK (accepted_at is null or revoked_at is null),
	CONSTRAINT "invitations_kind" CHECK (case kind when 'member' then cardinality(roles) > 0 and supplier_name is null when 'supplier' then supplier_name is not null and cardinality(roles) = 0 else false end)
);
--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "outbox" ALTER COLUMN "message_id" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "outbox" ADD COLUMN "invitation_id" uuid;--> statement-breakpoint
ALTER TABLE "outbox" ADD COLUMN "invitation_nonce" text;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_relationship_fk" FOREIGN KEY ("relationship_id","supplier_org_id","org_id") REFERENCES "public"."relationships"("id","supplier_org_id","customer_org_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_open" ON "invitations" USING btree ("org_id","kind",lower("email")) WHERE accepted_at is null and revoked_at is null;--> statement-breakpoint
CREATE INDEX "invitations_newest" ON "invitations" USING btree ("org_id","kind","created_at");--> statement-breakpoint
CREATE INDEX "invitations_token" ON "invitations" USING btree ("token_hash");--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_invitation_fk" FOREIGN KEY ("org_id","invitation_id") REFERENCES "public"."invitations"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_one_thing" CHECK ((message_id is null) <> (invitation_id is null) and (invitation_id is null) = (invitation_nonce is null));--> statement-breakpoint
CREATE POLICY "invitations_owner" ON "invitations" AS PERMISSIVE FOR ALL TO "evenrule_app", "evenrule_system" USING (org_id = nullif(current_setting('app.org_id', true), '')::uuid) WITH CHECK (org_id = nullif(current_setting('app.org_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_begin_open" ON "invitations" AS RESTRICTIVE FOR INSERT TO "evenrule_app", "evenrule_system" WITH CHECK (accepted_at is null and revoked_at is null);