ALTER TABLE column_mappings FORCE ROW LEVEL SECURITY;
--> statement-breakpoint
-- A mapping is a habit, not a record: what is read without help again is forgotten.
GRANT SELECT, INSERT, UPDATE, DELETE ON column_mappings TO evenrule_app;
