-- What the queue's housekeeping removes, across groups; the server's role deletes nothing by itself. A session that
-- has ended stays a month, so that its owner can still see it.
CREATE FUNCTION remove_expired() RETURNS integer LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    WITH gone AS (
      DELETE FROM public.sessions
      WHERE least(expires_at, revoked_at) < now() - interval '30 days' RETURNING 1
    )
    SELECT count(*)::integer FROM gone
  $$;--> statement-breakpoint
-- When the newest migration here was made, as the migrator notes it: what a server compares with its own files.
CREATE FUNCTION newest_migration() RETURNS bigint LANGUAGE sql STABLE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$ SELECT max(created_at) FROM drizzle.__drizzle_migrations $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION remove_expired(), newest_migration() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION remove_expired(), newest_migration() TO emberline_server;
