-- Invitations: forced row security, grants, and the functions that cross from the one who invites to the one invited.

ALTER TABLE invitations FORCE ROW LEVEL SECURITY;
--> statement-breakpoint
-- That an invitation was accepted is written by accept_invitation alone.
GRANT SELECT, INSERT, UPDATE (nonce, token_hash, sent_at, expires_on, revoked_at, revoked_by, row_version) ON invitations
  TO evenrule_app;
--> statement-breakpoint
-- What the worker writes the mail from, as the organisation that sends it; never the hash of the token.
GRANT SELECT (
  org_id, id, kind, side, email, supplier_name, supplier_number, roles, ends_on, message, invited_by, nonce, sent_at, expires_on,
  accepted_at, revoked_at
) ON invitations TO evenrule_system;
--> statement-breakpoint
-- What the holder of a link may be told, by the hash of its token. With p_lock the organisation that invites is locked
-- first, so that of two who accept at once the second sees what the first has done.
CREATE FUNCTION invitation_by_token(p_hash text, p_lock boolean)
RETURNS TABLE (
  org_id uuid, id uuid, kind text, side text, email text, supplier_name text, supplier_number text, roles text[],
  ends_on date, message text, nonce text, expires_on date, accepted_at timestamptz, accepted_by uuid, accepted_for uuid,
  revoked_at timestamptz, org_name text, time_zone text, inviter text, supplying uuid[]
)
LANGUAGE plpgsql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  me uuid := nullif(current_setting('app.user_id', true), '')::uuid;
BEGIN
  IF p_lock THEN
    PERFORM 1 FROM organisations o
    WHERE o.id = (SELECT i.org_id FROM invitations i WHERE i.token_hash = p_hash) FOR NO KEY UPDATE;
  END IF;
  RETURN QUERY
    SELECT i.org_id, i.id, i.kind, i.side, i.email, i.supplier_name, i.supplier_number, i.roles,
      i.ends_on, i.message, i.nonce, i.expires_on, i.accepted_at, i.accepted_by,
      CASE WHEN i.kind = 'member' THEN i.org_id ELSE i.supplier_org_id END,
      i.revoked_at, o.name, o.time_zone, u.name,
      -- Which of the person's own organisations supply the one that invites already.
      ARRAY(SELECT r.supplier_org_id FROM relationships r
        JOIN memberships m ON m.org_id = r.supplier_org_id AND m.user_id = me
        WHERE r.customer_org_id = i.org_id)
    FROM invitations i JOIN organisations o ON o.id = i.org_id LEFT JOIN users u ON u.id = i.invited_by
    WHERE i.token_hash = p_hash;
END $$;
--> statement-breakpoint
-- Whether the current person has proved the address that an open invitation was sent to.
CREATE FUNCTION is_invited(p_hash text) RETURNS boolean
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT EXISTS (
    SELECT 1 FROM invitations i JOIN users u ON lower(u.email) = lower(i.email)
    WHERE i.token_hash = p_hash AND i.accepted_at IS NULL AND i.revoked_at IS NULL AND u.email_verified
      AND u.id = nullif(current_setting('app.user_id', true), '')::uuid)
$$;
--> statement-breakpoint
-- Uses an invitation up in the name of the current person: a membership, or the relationship of the current
-- organisation, of which the person is an admin, with the one that invites.
CREATE FUNCTION accept_invitation(p_hash text, p_relationship uuid, p_at timestamptz) RETURNS void
LANGUAGE plpgsql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  me uuid := nullif(current_setting('app.user_id', true), '')::uuid;
  own uuid := nullif(current_setting('app.org_id', true), '')::uuid;
  found_one invitations%ROWTYPE;
BEGIN
  SELECT * INTO found_one FROM invitations i WHERE i.token_hash = p_hash FOR UPDATE;
  IF found_one.id IS NULL OR NOT is_invited(p_hash) THEN
    RAISE EXCEPTION 'not invited' USING ERRCODE = 'insufficient_privilege';
  END IF;
  IF found_one.kind = 'member' THEN
    INSERT INTO memberships (org_id, user_id, roles, created_at, ends_on)
    VALUES (found_one.org_id, me, found_one.roles, p_at, found_one.ends_on)
    ON CONFLICT (org_id, user_id) DO UPDATE
      SET roles = excluded.roles, ends_on = excluded.ends_on, row_version = memberships.row_version + 1;
    UPDATE invitations SET accepted_at = p_at, accepted_by = me, row_version = row_version + 1
    WHERE id = found_one.id;
  ELSE
    IF NOT EXISTS (SELECT 1 FROM memberships m JOIN organisations o ON o.id = m.org_id
      WHERE m.org_id = own AND m.user_id = me AND 'admin' = ANY (m.roles)
        AND (m.ends_on IS NULL OR m.ends_on >= (p_at AT TIME ZONE o.time_zone)::date)) THEN
      RAISE EXCEPTION 'no admin of the organisation that accepts' USING ERRCODE = 'insufficient_privilege';
    END IF;
    INSERT INTO relationships (id, supplier_org_id, customer_org_id, time_zone, supplier_number, created_at)
    SELECT p_relationship, own, o.id, o.time_zone, found_one.supplier_number, p_at
    FROM organisations o WHERE o.id = found_one.org_id;
    UPDATE invitations
    SET accepted_at = p_at, accepted_by = me, relationship_id = p_relationship, supplier_org_id = own,
      row_version = row_version + 1
    WHERE id = found_one.id;
  END IF;
END $$;
--> statement-breakpoint
-- Founds the current organisation, which does not exist yet, with the current person as its admin; only for somebody
-- who holds an open invitation of a supplier.
CREATE FUNCTION found_organisation(p_hash text, p_name text, p_time_zone text, p_at timestamptz) RETURNS void
LANGUAGE plpgsql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  own uuid := nullif(current_setting('app.org_id', true), '')::uuid;
BEGIN
  IF NOT is_invited(p_hash)
    OR NOT EXISTS (SELECT 1 FROM invitations i WHERE i.token_hash = p_hash AND i.kind = 'supplier') THEN
    RAISE EXCEPTION 'not invited' USING ERRCODE = 'insufficient_privilege';
  END IF;
  INSERT INTO organisations (id, name, time_zone, created_at) VALUES (own, p_name, p_time_zone, p_at);
  INSERT INTO memberships (org_id, user_id, roles, created_at)
  VALUES (own, nullif(current_setting('app.user_id', true), '')::uuid, '{admin}', p_at);
END $$;
--> statement-breakpoint
-- Puts the mail of one of the current organisation's invitations, as it stands, into the outbox.
CREATE FUNCTION mail_invitation(p_invitation uuid, p_at timestamptz) RETURNS void
LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  INSERT INTO outbox (id, org_id, invitation_id, invitation_nonce, next_attempt_at)
  SELECT uuid_v7(), i.org_id, i.id, i.nonce, p_at FROM invitations i
  WHERE i.id = p_invitation AND i.org_id = nullif(current_setting('app.org_id', true), '')::uuid
$$;
--> statement-breakpoint
-- Where a person was a member until a day that is over, the latest first; to tell them why it is gone.
CREATE FUNCTION ended_memberships_of_person(p_user uuid, p_now timestamptz)
RETURNS TABLE (org_name text, ends_on date)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT o.name, m.ends_on FROM memberships m JOIN organisations o ON o.id = m.org_id
  WHERE m.user_id = p_user AND m.ends_on < (p_now AT TIME ZONE o.time_zone)::date
  ORDER BY m.ends_on DESC, o.name
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION
  invitation_by_token(text, boolean), is_invited(text), accept_invitation(text, uuid, timestamptz),
  found_organisation(text, text, text, timestamptz), mail_invitation(uuid, timestamptz),
  ended_memberships_of_person(uuid, timestamptz)
  FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION
  invitation_by_token(text, boolean), accept_invitation(text, uuid, timestamptz),
  found_organisation(text, text, text, timestamptz), mail_invitation(uuid, timestamptz),
  ended_memberships_of_person(uuid, timestamptz)
  TO evenrule_app;
