-- Revisions and evaluations are written once. Privileges already keep the server's role from changing them;
-- this refuses the owner as well. Per statement, so that it speaks up even where row-level security hides the row.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql
  SET search_path = pg_catalog
  AS $$
  BEGIN
    RAISE EXCEPTION '% is written once: % refused', TG_TABLE_NAME, TG_OP
      USING ERRCODE = 'restrict_violation', HINT = 'Add a new revision or evaluation instead.';
  END
  $$;--> statement-breakpoint
CREATE TRIGGER "history_revisions_written_once" BEFORE UPDATE OR DELETE OR TRUNCATE ON "history_revisions"
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER "candidate_revisions_written_once" BEFORE UPDATE OR DELETE OR TRUNCATE ON "candidate_revisions"
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER "evaluations_written_once" BEFORE UPDATE OR DELETE OR TRUNCATE ON "evaluations"
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
