ALTER TABLE imports FORCE ROW LEVEL SECURITY;
--> statement-breakpoint
-- What was imported never changes, only how far it is.
GRANT SELECT, INSERT, UPDATE (state, counts, left_out, done, failure, alive_at, finished_at, row_version) ON imports
  TO evenrule_app;
