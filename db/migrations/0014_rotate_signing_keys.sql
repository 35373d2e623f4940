-- Keys belong to no group and no person: the server's role reaches them through the functions alone.
ALTER TABLE "signing_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "signing_keys" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "signing_keys" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
CREATE FUNCTION all_signing_keys()
  RETURNS TABLE (kid text, sealed_jwk text, created_at timestamptz)
  LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    SELECT k.kid, k.sealed_jwk, k.created_at FROM public.signing_keys k ORDER BY k.created_at DESC, k.kid
  $$;--> statement-breakpoint
-- Adds a key as long as the newest is still the one the caller saw, null for none: of several servers that try at
-- once, one succeeds.
CREATE FUNCTION add_signing_key(new_kid text, new_sealed_jwk text, newest_seen text) RETURNS void
  LANGUAGE plpgsql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
  BEGIN
    LOCK TABLE public.signing_keys IN SHARE ROW EXCLUSIVE MODE;
    INSERT INTO public.signing_keys (kid, sealed_jwk)
      SELECT new_kid, new_sealed_jwk
      WHERE newest_seen IS NOT DISTINCT FROM
        (SELECT k.kid FROM public.signing_keys k ORDER BY k.created_at DESC, k.kid LIMIT 1);
  END
  $$;--> statement-breakpoint
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
    ), gone_codes AS (
      DELETE FROM public.recovery_codes WHERE used_at < now() - interval '30 days' RETURNING 1
    ), gone_keys AS (
      DELETE FROM public.signing_keys WHERE created_at < now() - interval '90 days' RETURNING 1
    )
    SELECT count(*)::integer FROM (
      SELECT FROM gone_sessions UNION ALL SELECT FROM gone_tokens UNION ALL SELECT FROM gone_invitations
      UNION ALL SELECT FROM gone_attempts UNION ALL SELECT FROM gone_codes UNION ALL SELECT FROM gone_keys
    ) gone
  $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION all_signing_keys(), add_signing_key(text, text, text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION all_signing_keys(), add_signing_key(text, text, text) TO emberline_server;
