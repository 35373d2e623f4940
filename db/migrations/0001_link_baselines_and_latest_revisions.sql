-- Keys between tables that point at each other; written by hand because declaring them in db/schema
-- would make its modules import one another in a circle.
ALTER TABLE "groups" ADD CONSTRAINT "groups_baseline_revision_fk"
  FOREIGN KEY ("id", "baseline_revision_id") REFERENCES "history_revisions" ("group_id", "id");--> statement-breakpoint
-- Deferred: a record and its first revision are written in one transaction, in either order.
ALTER TABLE "histories" ADD CONSTRAINT "histories_latest_revision_fk"
  FOREIGN KEY ("group_id", "id", "latest_number") REFERENCES "history_revisions" ("group_id", "history_id", "number")
  DEFERRABLE INITIALLY DEFERRED;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_latest_revision_fk"
  FOREIGN KEY ("group_id", "id", "latest_number") REFERENCES "candidate_revisions" ("group_id", "candidate_id", "number")
  DEFERRABLE INITIALLY DEFERRED;
