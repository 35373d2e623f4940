-- What belongs to a person and not to a group is seen in a transaction that names the person, as a group's rows are
-- in one that names the group.
CREATE FUNCTION current_person_id() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE
  SET search_path = pg_catalog
  AS $$ SELECT nullif(current_setting('emberline.person_id', true), '')::uuid $$;--> statement-breakpoint
-- Members of a group see each other; only the person changes what is theirs.
DROP POLICY "own_group" ON "users";--> statement-breakpoint
CREATE POLICY "own_group" ON "users" FOR SELECT
  USING (EXISTS (SELECT 1 FROM "memberships" m WHERE m."user_id" = "users"."id" AND m."group_id" = current_group_id()));--> statement-breakpoint
CREATE POLICY "own_person" ON "users"
  USING ("id" = current_person_id());--> statement-breakpoint
CREATE POLICY "own_person" ON "memberships" FOR SELECT
  USING ("user_id" = current_person_id());--> statement-breakpoint
CREATE POLICY "own_person" ON "groups" FOR SELECT
  USING (EXISTS (SELECT 1 FROM "memberships" m WHERE m."group_id" = "groups"."id" AND m."user_id" = current_person_id()));--> statement-breakpoint
DROP POLICY "own_group" ON "sessions";--> statement-breakpoint
CREATE POLICY "own_person" ON "sessions"
  USING ("user_id" = current_person_id());--> statement-breakpoint
ALTER TABLE "one_time_tokens" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "one_time_tokens" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_person" ON "one_time_tokens"
  USING ("user_id" = current_person_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "one_time_tokens" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "invitations" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "invitations"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "invitations" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "attempts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "attempts" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "attempts" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
GRANT SELECT ("email_verified_at", "created_at") ON "users" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("name", "email", "email_verified_at", "password_hash") ON "users" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("group_id") ON "sessions" TO emberline_server;--> statement-breakpoint
GRANT SELECT ("id", "purpose", "user_id", "email", "created_at", "expires_at", "used_at") ON "one_time_tokens" TO emberline_server;--> statement-breakpoint
GRANT SELECT ("id", "group_id", "email", "role", "invited_by", "created_at", "expires_at", "withdrawn_at", "accepted_at", "accepted_by")
  ON "invitations" TO emberline_server;--> statement-breakpoint
GRANT INSERT ON "one_time_tokens", "invitations" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("used_at") ON "one_time_tokens" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("withdrawn_at") ON "invitations" TO emberline_server;--> statement-breakpoint
-- Before the person is known. The group is the one used last, else the first joined; null for who is in none.
DROP FUNCTION account_for_sign_in(text);--> statement-breakpoint
CREATE FUNCTION account_for_sign_in(sought_email text)
  RETURNS TABLE (user_id uuid, password_hash text, group_id uuid)
  LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    SELECT u.id, u.password_hash, m.group_id
    FROM public.users u LEFT JOIN public.memberships m ON m.user_id = u.id
    WHERE u.email = lower(sought_email)
    ORDER BY (SELECT max(s.last_used_at) FROM public.sessions s
              WHERE s.user_id = u.id AND s.group_id = m.group_id) DESC NULLS LAST, m.created_at, m.group_id
    LIMIT 1
  $$;--> statement-breakpoint
-- The hash of the password of the person the transaction names; null without one.
CREATE FUNCTION own_password_hash() RETURNS text LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$ SELECT password_hash FROM public.users WHERE id = public.current_person_id() $$;--> statement-breakpoint
CREATE FUNCTION live_token(sought_id uuid)
  RETURNS TABLE (purpose public.token_purpose, user_id uuid, email text, secret_hash text)
  LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    SELECT purpose, user_id, email, secret_hash FROM public.one_time_tokens
    WHERE id = sought_id AND used_at IS NULL AND expires_at > now()
  $$;--> statement-breakpoint
CREATE FUNCTION live_invitation(sought_id uuid)
  RETURNS TABLE (email text, role public.member_role, secret_hash text, group_name text, inviter_name text,
    account_id uuid, password_hash text)
  LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    SELECT i.email, i.role, i.secret_hash, g.name, inviter.name, account.id, account.password_hash
    FROM public.invitations i
    JOIN public.groups g ON g.id = i.group_id
    JOIN public.users inviter ON inviter.id = i.invited_by
    LEFT JOIN public.users account ON account.email = i.email
    WHERE i.id = sought_id AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL AND i.expires_at > now()
  $$;--> statement-breakpoint
-- Makes the account unless there is one, and the membership. `expected_account` is whose password was checked: an
-- account made meanwhile is not entered by the password of another. No row: used up, withdrawn or expired meanwhile.
CREATE FUNCTION accept_invitation(invitation_id uuid, expected_account uuid, new_name text, new_password_hash text)
  RETURNS TABLE (user_id uuid, group_id uuid)
  LANGUAGE plpgsql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
  DECLARE
    invitation public.invitations;
    account uuid;
  BEGIN
    SELECT * INTO invitation FROM public.invitations i
      WHERE i.id = invitation_id AND i.accepted_at IS NULL AND i.withdrawn_at IS NULL AND i.expires_at > now()
      FOR UPDATE;
    IF NOT FOUND THEN RETURN; END IF;
    SELECT u.id INTO account FROM public.users u WHERE u.email = invitation.email;
    IF account IS DISTINCT FROM expected_account THEN RETURN; END IF;
    IF account IS NULL THEN
      INSERT INTO public.users (email, name, password_hash, email_verified_at)
        VALUES (invitation.email, new_name, new_password_hash, now()) RETURNING id INTO account;
    ELSE
      UPDATE public.users u SET email_verified_at = coalesce(u.email_verified_at, now()) WHERE u.id = account;
    END IF;
    INSERT INTO public.memberships (group_id, user_id, role)
      VALUES (invitation.group_id, account, invitation.role) ON CONFLICT DO NOTHING;
    UPDATE public.invitations i SET accepted_at = now(), accepted_by = account WHERE i.id = invitation_id;
    RETURN QUERY SELECT account, invitation.group_id;
  END
  $$;--> statement-breakpoint
CREATE FUNCTION awaits_first_group() RETURNS boolean LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$ SELECT NOT EXISTS (SELECT FROM public.groups) $$;--> statement-breakpoint
CREATE FUNCTION issue_first_group_token(token_id uuid, new_secret_hash text, lifetime interval) RETURNS void
  LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    INSERT INTO public.one_time_tokens (id, purpose, secret_hash, expires_at)
    VALUES (token_id, 'first-group', new_secret_hash, now() + lifetime)
  $$;--> statement-breakpoint
-- The first group and its lead, once: no row when there is a group already or the token was used meanwhile.
CREATE FUNCTION found_first_group(token_id uuid, group_name text, lead_name text, lead_email text, lead_password_hash text)
  RETURNS TABLE (user_id uuid, group_id uuid)
  LANGUAGE plpgsql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
  DECLARE
    new_user uuid;
    new_group uuid;
  BEGIN
    LOCK TABLE public.groups IN SHARE ROW EXCLUSIVE MODE;
    IF EXISTS (SELECT FROM public.groups) THEN RETURN; END IF;
    UPDATE public.one_time_tokens SET used_at = now()
      WHERE id = token_id AND purpose = 'first-group' AND used_at IS NULL AND expires_at > now();
    IF NOT FOUND THEN RETURN; END IF;
    INSERT INTO public.groups (name) VALUES (group_name) RETURNING id INTO new_group;
    INSERT INTO public.users (email, name, password_hash)
      VALUES (lower(lead_email), lead_name, lead_password_hash) RETURNING id INTO new_user;
    INSERT INTO public.memberships (group_id, user_id, role) VALUES (new_group, new_user, 'lead');
    RETURN QUERY SELECT new_user, new_group;
  END
  $$;--> statement-breakpoint
-- Counts an attempt against every budget, or says how many seconds to wait when one of them is used up. Counting comes
-- before the answer is known, so that attempts made at once cannot pass together; a success is forgiven afterwards.
CREATE FUNCTION take_attempt(budgets text[], limits integer[], period interval)
  RETURNS TABLE (wait_seconds integer, attempt_ids bigint[])
  LANGUAGE plpgsql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
  DECLARE
    wait interval;
  BEGIN
    PERFORM pg_advisory_xact_lock(hashtextextended('emberline attempt ' || b, 0))
      FROM (SELECT unnest(budgets) AS b ORDER BY 1) ordered;
    SELECT max(free.at + period - now()) INTO wait
    FROM unnest(budgets, limits) AS asked (budget, allowed)
    CROSS JOIN LATERAL (
      SELECT a.at FROM public.attempts a WHERE a.budget = asked.budget AND a.at > now() - period
      ORDER BY a.at DESC OFFSET asked.allowed - 1 LIMIT 1
    ) free;
    IF wait IS NOT NULL THEN
      RETURN QUERY SELECT greatest(1, ceil(extract(epoch FROM wait)))::integer, '{}'::bigint[];
      RETURN;
    END IF;
    RETURN QUERY
      WITH counted AS (INSERT INTO public.attempts (budget) SELECT unnest(budgets) RETURNING id)
      SELECT 0, array_agg(id) FROM counted;
  END
  $$;--> statement-breakpoint
CREATE FUNCTION forgive_attempt(attempt_ids bigint[]) RETURNS void LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$ DELETE FROM public.attempts WHERE id = ANY (attempt_ids) $$;--> statement-breakpoint
CREATE OR REPLACE FUNCTION remove_expired() RETURNS integer LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    WITH gone_sessions AS (
      DELETE FROM public.sessions
      WHERE least(expires_at, revoked_at) < now() - interval '30 days' RETURNING 1
    ), gone_tokens AS (
      DELETE FROM public.one_time_tokens
      WHERE least(expires_at, used_at) < now() - interval '1 day' RETURNING 1
    ), gone_invitations AS (
      DELETE FROM public.invitations
      WHERE accepted_at IS NULL AND least(expires_at, withdrawn_at) < now() - interval '30 days' RETURNING 1
    ), gone_attempts AS (
      DELETE FROM public.attempts WHERE at < now() - interval '1 day' RETURNING 1
    )
    SELECT count(*)::integer FROM (
      SELECT FROM gone_sessions UNION ALL SELECT FROM gone_tokens
      UNION ALL SELECT FROM gone_invitations UNION ALL SELECT FROM gone_attempts
    ) gone
  $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION account_for_sign_in(text), own_password_hash(), live_token(uuid), live_invitation(uuid),
  accept_invitation(uuid, uuid, text, text), awaits_first_group(), issue_first_group_token(uuid, text, interval),
  found_first_group(uuid, text, text, text, text), take_attempt(text[], integer[], interval),
  forgive_attempt(bigint[]) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION account_for_sign_in(text), own_password_hash(), live_token(uuid), live_invitation(uuid),
  accept_invitation(uuid, uuid, text, text), awaits_first_group(), issue_first_group_token(uuid, text, interval),
  found_first_group(uuid, text, text, text, text), take_attempt(text[], integer[], interval),
  forgive_attempt(bigint[]) TO emberline_server;
