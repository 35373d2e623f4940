ALTER TABLE "second_factors" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "second_factors" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_person" ON "second_factors"
  USING ("user_id" = current_person_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "second_factors" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
ALTER TABLE "recovery_codes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "recovery_codes" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE POLICY "own_person" ON "recovery_codes"
  USING ("user_id" = current_person_id());--> statement-breakpoint
CREATE POLICY "owner_across_groups" ON "recovery_codes" TO emberline_owner
  USING (across_groups());--> statement-breakpoint
GRANT SELECT, INSERT ON "second_factors", "recovery_codes" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("sealed_secret", "confirmed_at", "last_step") ON "second_factors" TO emberline_server;--> statement-breakpoint
GRANT UPDATE ("used_at") ON "recovery_codes" TO emberline_server;
