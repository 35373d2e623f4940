ALTER TABLE "guest_links" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "guest_links" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_group" ON "guest_links"
  USING ("group_id" = current_group_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "guest_links" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
GRANT SELECT ("id", "group_id", "kind", "subject_id", "note", "created_by", "created_at", "expires_at", "last_used_at", "revoked_at")
  ON "guest_links" TO emberline_server;--> statement-breakpoint
GRANT INSERT ON "guest_links" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("revoked_at") ON "guest_links" TO emberline_server;--> statement-breakpoint
-- A link hangs on something of its own group. Two tables cannot share one foreign key, so a trigger looks.
CREATE FUNCTION guest_link_has_subject() RETURNS trigger LANGUAGE plpgsql
  SET search_path = pg_catalog, public, pg_temp
  AS $$
  BEGIN
    IF NEW.kind = 'evaluation' AND EXISTS (
         SELECT 1 FROM public.evaluations e WHERE e.id = NEW.subject_id AND e.group_id = NEW.group_id)
      OR NEW.kind = 'history-revision' AND EXISTS (
         SELECT 1 FROM public.history_revisions r WHERE r.id = NEW.subject_id AND r.group_id = NEW.group_id)
    THEN RETURN NEW;
    END IF;
    RAISE EXCEPTION 'guest_links_subject: the group has no such %', NEW.kind USING ERRCODE = 'foreign_key_violation';
  END
  $$;--> statement-breakpoint
CREATE TRIGGER "guest_links_subject" BEFORE INSERT ON "guest_links"
  FOR EACH ROW EXECUTE FUNCTION guest_link_has_subject();--> statement-breakpoint
-- Finds a link that is neither revoked nor expired by the hash of its token, and notes its use (once a minute, to
-- spare writes).
CREATE FUNCTION use_guest_link(sought_hash text)
  RETURNS TABLE (
    link_id uuid, group_id uuid, group_name text, kind public.guest_link_kind, subject_id uuid, expires_at timestamptz
  )
  LANGUAGE sql VOLATILE SECURITY DEFINER
  SET search_path = pg_catalog, public, pg_temp
  AS $$
    UPDATE public.guest_links SET last_used_at = now()
    WHERE token_hash = sought_hash AND revoked_at IS NULL AND (expires_at IS NULL OR expires_at > now())
      AND (last_used_at IS NULL OR last_used_at < now() - interval '1 minute');
    SELECT l.id, l.group_id, g.name, l.kind, l.subject_id, l.expires_at
    FROM public.guest_links l JOIN public.groups g ON g.id = l.group_id
    WHERE l.token_hash = sought_hash AND l.revoked_at IS NULL AND (l.expires_at IS NULL OR l.expires_at > now())
  $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION use_guest_link(text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION use_guest_link(text) TO emberline_server;
