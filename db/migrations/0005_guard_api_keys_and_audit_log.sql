ALTER TABLE "api_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "api_keys" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "api_keys"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "api_keys" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "audit_entries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "audit_entries" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "audit_entries"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "audit_entries" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
-- The server's role reads all of a key but the hash of its secret, and may only end it.
GRANT SELECT ("id", "group_id", "user_id", "name", "scope", "beginning", "created_at", "expires_at", "last_used_at", "revoked_at")
  ON "api_keys" TO emberline_server;--> statement-breakpoint
GRANT INSERT ON "api_keys" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("revoked_at") ON "api_keys" TO emberline_server;--> statement-breakpoint
GRANT SELECT, INSERT ON "audit_entries" TO emberline_server;--> statement-breakpoint
CREATE TRIGGER "audit_entries_written_once" BEFORE UPDATE OR DELETE OR TRUNCATE ON "audit_entries"
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint
-- Finds a key that is neither revoked nor expired by the hash of its secret, and notes its use (once a minute, to
-- spare writes). A secret has 256 random bits: comparing hashes through an index tells nothing worth timing.
CREATE FUNCTION use_api_key(sought_hash text)
  RETURNS TABLE (
    key_id uuid, expires_at timestamptz, scope public.key_scope, requests_per_minute integer,
    user_id uuid, user_name text, user_email text,
    group_id uuid, group_name text, baseline_revision_id uuid, role public.member_role
  )
  LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    UPDATE public.api_keys SET last_used_at = now()
    WHERE secret_hash = sought_hash AND revoked_at IS NULL AND expires_at > now()
      AND (last_used_at IS NULL OR last_used_at < now() - interval '1 minute');
    SELECT k.id, k.expires_at, k.scope, k.requests_per_minute, u.id, u.name, u.email, g.id, g.name, g.baseline_revision_id, m.role
    FROM public.api_keys k
    JOIN public.users u ON u.id = k.user_id
    JOIN public.groups g ON g.id = k.group_id
    JOIN public.memberships m ON m.group_id = k.group_id AND m.user_id = k.user_id
    WHERE k.secret_hash = sought_hash AND k.revoked_at IS NULL AND k.expires_at > now()
  $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION use_api_key(text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION use_api_key(text) TO emberline_server;
