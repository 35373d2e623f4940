-- Row-level security: a transaction sees one group, the one named by the setting emberline.group_id; without
-- it, none. It is forced on the owner too, who sees more only inside the look-up functions below (there the role
-- that signed in is another) or after saying emberline.across_groups = 'on'. The policies that honour this name
-- the owner's role alone, so the server's role gains nothing by the setting.
CREATE FUNCTION current_group_id() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE
  SET search_path = pg_catalog
  AS $$ SELECT nullif(current_setting('emberline.group_id', true), '')::uuid $$;--> statement-breakpoint
CREATE FUNCTION across_groups() RETURNS boolean LANGUAGE sql STABLE PARALLEL SAFE
  SET search_path = pg_catalog
  AS $$ SELECT session_user <> current_user OR coalesce(current_setting('emberline.across_groups', true), '') = 'on' $$;--> statement-breakpoint
ALTER TABLE "users" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "users" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "users"
  USING (EXISTS (SELECT 1 FROM "memberships" m WHERE m."user_id" = "users"."id" AND m."group_id" = current_group_id()));--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "users" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "groups" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "groups" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "groups"
  USING ("id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "groups" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "memberships" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "memberships"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "memberships" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "sessions" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "sessions"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "sessions" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "histories" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "histories" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "histories"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "histories" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "history_revisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "history_revisions" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "history_revisions"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "history_revisions" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "candidates" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "candidates" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "candidates"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "candidates" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "candidate_revisions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "candidate_revisions" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "candidate_revisions"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "candidate_revisions" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "evaluations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "evaluations" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "evaluations"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "evaluations" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
-- What the server's role may do, table by table. It may delete nothing and change no revision or evaluation.
GRANT SELECT ("id", "email", "name") ON "users" TO emberline_server;--> statement-breakpoint
GRANT SELECT ON "groups", "memberships" TO emberline_server;--> statement-breakpoint
GRANT SELECT, INSERT ON "sessions", "histories", "candidates" TO emberline_server;--> statement-breakpoint
GRANT SELECT, INSERT ON "history_revisions", "candidate_revisions", "evaluations" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("revoked_at") ON "sessions" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("latest_number", "updated_at") ON "histories", "candidates" TO emberline_server;--> statement-breakpoint
-- The look-ups made before the group is known. They run as the owner, across groups, with a fixed search path.
CREATE FUNCTION account_for_sign_in(sought_email text)
  RETURNS TABLE (user_id uuid, password_hash text, group_id uuid)
  LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    SELECT u.id, u.password_hash, m.group_id
    FROM public.users u JOIN public.memberships m ON m.user_id = u.id
    WHERE u.email = lower(sought_email)
    ORDER BY m.created_at, m.group_id
    LIMIT 1
  $$;--> statement-breakpoint
-- Finds a session that is neither revoked nor expired, and notes its use (once a minute, to spare writes).
CREATE FUNCTION use_session(sought_id uuid)
  RETURNS TABLE (
    session_id uuid, expires_at timestamptz, user_id uuid, user_name text, user_email text,
    group_id uuid, group_name text, baseline_revision_id uuid, role public.member_role
  )
  LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    UPDATE public.sessions SET last_used_at = now()
    WHERE id = sought_id AND revoked_at IS NULL AND expires_at > now()
      AND last_used_at < now() - interval '1 minute';
    SELECT s.id, s.expires_at, u.id, u.name, u.email, g.id, g.name, g.baseline_revision_id, m.role
    FROM public.sessions s
    JOIN public.users u ON u.id = s.user_id
    JOIN public.groups g ON g.id = s.group_id
    JOIN public.memberships m ON m.group_id = s.group_id AND m.user_id = s.user_id
    WHERE s.id = sought_id AND s.revoked_at IS NULL AND s.expires_at > now()
  $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION account_for_sign_in(text), use_session(uuid) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION account_for_sign_in(text), use_session(uuid) TO emberline_server;
