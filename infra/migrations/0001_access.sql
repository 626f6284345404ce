-- What drizzle-kit does not emit: forced row security, grants, the session schema, and the few functions
-- that look across organisations. The roles are made by infra/start.mjs before the first migration.

DO $$
DECLARE t record;
BEGIN
  FOR t IN SELECT c.relname FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace WHERE n.nspname = 'public' AND c.relkind IN ('r', 'p') LOOP
    EXECUTE format('ALTER TABLE public.%I FORCE ROW LEVEL SECURITY', t.relname);
  END LOOP;
END $$;
--> statement-breakpoint
REVOKE ALL ON SCHEMA public FROM PUBLIC;
--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO evenrule_app, evenrule_system;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE ON
  sites, memberships, parts, part_revisions, characteristics, measuring_tasks,
  gauges, reference_standards, calibrations,
  agreements, agreement_versions, agreement_rounds, house_terms,
  studies, study_tasks, submission_studies, submission_by_hand
  TO evenrule_app;
--> statement-breakpoint
-- What is written once and never changed.
GRANT SELECT, INSERT ON
  files, agreement_signatures, agreement_comments, agreement_marks, study_data, study_evaluations, submission_texts, submission_clauses,
  submission_files, submission_signatures, submission_notes, challenge_messages,
  condition_reports, review_files, request_tasks, request_answers, reminders,
  gauge_events, standing_calibrations, standing_events, reinstatements, carry_overs, record_events
  TO evenrule_app;
--> statement-breakpoint
-- What these rows are about never changes, only where they stand.
GRANT SELECT, INSERT, UPDATE (
  number, state, state_since, sent_for_signature_at, submitted_at, decided_at, withdrawal_reason, criteria, verdict,
  clauses_met, clauses_total, safety, superseded_by, row_version
) ON submissions TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (due_on, withdrawn_by, withdrawn_at, withdrawal_reason, row_version) ON requests
  TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (sequence, hash) ON record_heads TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (
  state, second_by, second_at, sent_back_reason, other_side_by, other_side_at, declined_reason
) ON decisions TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (state, confirmed_at, row_version) ON conditions TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (
  state, answered_at, laboratory, closed_by, closed_at, row_version
) ON challenges TO evenrule_app;
--> statement-breakpoint
GRANT SELECT ON organisations, relationships TO evenrule_app;
--> statement-breakpoint
GRANT UPDATE (name, time_zone, row_version) ON organisations TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, UPDATE (name, muted_mail) ON users TO evenrule_app;
--> statement-breakpoint
GRANT SELECT, UPDATE (read_at) ON messages TO evenrule_app;
--> statement-breakpoint
GRANT INSERT ON security_events TO evenrule_app;
--> statement-breakpoint
GRANT DELETE ON memberships, agreements, agreement_rounds, agreement_versions, house_terms, submission_studies, submission_by_hand
  TO evenrule_app;
--> statement-breakpoint
GRANT SELECT ON messages, users TO evenrule_system;
--> statement-breakpoint
GRANT SELECT, UPDATE ON outbox TO evenrule_system;
--> statement-breakpoint
-- What reminders follow from. The worker reads as one organisation after the other, inside its row security, and
-- writes nothing but what it reminded of, and the messages, through notify_party.
GRANT SELECT ON
  organisations, relationships, parts, part_revisions, characteristics, measuring_tasks, gauges, reference_standards,
  calibrations, agreements, agreement_versions, agreement_signatures, submissions, submission_texts, decisions, conditions,
  challenges, requests, request_tasks, request_answers, standing_calibrations, standing_events, reinstatements, carry_overs
  TO evenrule_system;
--> statement-breakpoint
GRANT SELECT, INSERT ON reminders TO evenrule_system;
--> statement-breakpoint
CREATE SCHEMA session;
--> statement-breakpoint
CREATE TABLE session.session (
  sid varchar NOT NULL PRIMARY KEY,
  sess json NOT NULL,
  expire timestamp(6) NOT NULL
);
--> statement-breakpoint
CREATE INDEX session_expire ON session.session (expire);
--> statement-breakpoint
GRANT USAGE ON SCHEMA session TO evenrule_session;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON session.session TO evenrule_session;
--> statement-breakpoint
CREATE FUNCTION uuid_v7() RETURNS uuid LANGUAGE sql VOLATILE SET search_path = pg_catalog AS $$
  SELECT encode(
    set_bit(set_bit(
      overlay(uuid_send(gen_random_uuid())
        placing substring(int8send(floor(extract(epoch from clock_timestamp()) * 1000)::bigint) from 3)
        from 1 for 6),
      52, 1), 53, 1), 'hex')::uuid
$$;
--> statement-breakpoint
-- The person of a verified sign-in, made at the first one. Keyed by issuer and subject, never by e-mail.
CREATE FUNCTION sign_in_person(p_issuer text, p_subject text, p_email text, p_email_verified boolean, p_name text, p_at timestamptz)
RETURNS uuid LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  INSERT INTO users (id, issuer, subject, email, email_verified, name, created_at)
  VALUES (uuid_v7(), p_issuer, p_subject, p_email, p_email_verified, p_name, p_at)
  ON CONFLICT (issuer, subject) DO UPDATE SET email = excluded.email, email_verified = excluded.email_verified, name = excluded.name
  RETURNING id
$$;
--> statement-breakpoint
-- The organisations of one person, for sign-in and the switcher, with the sides each has.
CREATE FUNCTION memberships_of_person(p_user uuid, p_now timestamptz)
RETURNS TABLE (org_id uuid, org_name text, time_zone text, roles text[], supplies boolean, buys boolean)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT o.id, o.name, o.time_zone, m.roles,
    EXISTS (SELECT 1 FROM relationships r WHERE r.supplier_org_id = o.id),
    EXISTS (SELECT 1 FROM relationships r WHERE r.customer_org_id = o.id)
  FROM memberships m JOIN organisations o ON o.id = m.org_id
  WHERE m.user_id = p_user AND (m.ends_on IS NULL OR m.ends_on >= (p_now AT TIME ZONE o.time_zone)::date)
  ORDER BY o.name
$$;
--> statement-breakpoint
-- Names of people who are members of the current organisation or of one it has a relationship with.
CREATE FUNCTION names_of_people(p_ids uuid[])
RETURNS TABLE (id uuid, name text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  WITH me AS (SELECT nullif(current_setting('app.org_id', true), '')::uuid AS org)
  SELECT u.id, u.name FROM users u
  WHERE u.id = ANY (p_ids) AND EXISTS (
    SELECT 1 FROM memberships m, me
    WHERE m.user_id = u.id AND (
      m.org_id = me.org OR EXISTS (
        SELECT 1 FROM relationships r
        WHERE (r.supplier_org_id = me.org AND r.customer_org_id = m.org_id)
           OR (r.customer_org_id = me.org AND r.supplier_org_id = m.org_id))))
$$;
--> statement-breakpoint
-- Name and e-mail of the members of the current organisation, for its own pages.
CREATE FUNCTION members_of_current()
RETURNS TABLE (user_id uuid, name text, email text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT u.id, u.name, u.email FROM memberships m JOIN users u ON u.id = m.user_id
  WHERE m.org_id = nullif(current_setting('app.org_id', true), '')::uuid
$$;
--> statement-breakpoint
-- Writes a message, and its mail, to every member of one party who holds one of the roles. Either party may
-- tell the other; nobody else can be told, and the sender learns nothing of who they are.
CREATE FUNCTION notify_party(p_org uuid, p_side text, p_roles text[], p_except uuid, p_kind text, p_subject text, p_body text, p_link text, p_at timestamptz)
RETURNS integer LANGUAGE plpgsql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  me uuid := nullif(current_setting('app.org_id', true), '')::uuid;
  told integer := 0;
  person record;
  message uuid;
BEGIN
  IF me IS NULL OR NOT (p_org = me OR EXISTS (
    SELECT 1 FROM relationships r
    WHERE (r.supplier_org_id = me AND r.customer_org_id = p_org) OR (r.customer_org_id = me AND r.supplier_org_id = p_org))) THEN
    RAISE EXCEPTION 'no relationship with the organisation to be told' USING ERRCODE = 'insufficient_privilege';
  END IF;
  FOR person IN
    SELECT m.user_id, u.muted_mail FROM memberships m JOIN users u ON u.id = m.user_id
    WHERE m.org_id = p_org AND m.roles && p_roles AND m.user_id IS DISTINCT FROM p_except
      AND (m.ends_on IS NULL OR m.ends_on >= p_at::date)
  LOOP
    message := uuid_v7();
    INSERT INTO messages (id, org_id, user_id, side, kind, subject, body, link, created_at)
    VALUES (message, p_org, person.user_id, p_side, p_kind, p_subject, p_body, p_link, p_at);
    IF NOT person.muted_mail ? p_kind THEN
      INSERT INTO outbox (id, org_id, message_id, next_attempt_at) VALUES (uuid_v7(), p_org, message, p_at);
    END IF;
    told := told + 1;
  END LOOP;
  RETURN told;
END $$;
--> statement-breakpoint
-- Which organisations stand on which side, for the worker's chores: ids, and nothing of what they do.
CREATE FUNCTION organisations_with_sides()
RETURNS TABLE (org_id uuid, side text)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT supplier_org_id, 'supplier' FROM relationships
  UNION
  SELECT customer_org_id, 'customer' FROM relationships
  ORDER BY 1, 2
$$;
--> statement-breakpoint
REVOKE ALL ON ALL FUNCTIONS IN SCHEMA public FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION
  sign_in_person(text, text, text, boolean, text, timestamptz), memberships_of_person(uuid, timestamptz),
  names_of_people(uuid[]), members_of_current(),
  notify_party(uuid, text, text[], uuid, text, text, text, text, timestamptz)
  TO evenrule_app;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION
  organisations_with_sides(), notify_party(uuid, text, text[], uuid, text, text, text, text, timestamptz)
  TO evenrule_system;
