CREATE TYPE "public"."guest_link_kind" AS ENUM('evaluation', 'history-revision');--> statement-breakpoint
CREATE TABLE "guest_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"kind" "guest_link_kind" NOT NULL,
	"subject_id" uuid NOT NULL,
	"note" text NOT NULL,
	"token_hash" text NOT NULL,
	"created_by" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone,
	"last_used_at" timestamp (3) with time zone,
	"revoked_at" timestamp (3) with time zone,
	CONSTRAINT "guest_links_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "guest_links_token_sha256" CHECK ("guest_links"."token_hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
ALTER TABLE "guest_links" ADD CONSTRAINT "guest_links_member_fk" FOREIGN KEY ("group_id","created_by") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "guest_links_newest_first" ON "guest_links" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "guest_links_of_subject" ON "guest_links" USING btree ("group_id","subject_id");