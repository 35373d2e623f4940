CREATE TYPE "public"."token_purpose" AS ENUM('first-group', 'verify-email', 'change-email', 'reset-password');--> statement-breakpoint
CREATE TABLE "attempts" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"budget" text NOT NULL,
	"at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"email" text NOT NULL,
	"role" "member_role" NOT NULL,
	"invited_by" uuid NOT NULL,
	"secret_hash" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"withdrawn_at" timestamp (3) with time zone,
	"accepted_at" timestamp (3) with time zone,
	"accepted_by" uuid,
	CONSTRAINT "invitations_email_lower_case" CHECK ("invitations"."email" = lower("invitations"."email")),
	CONSTRAINT "invitations_secret_sha256" CHECK ("invitations"."secret_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "invitations_accepted_by_somebody" CHECK (("invitations"."accepted_at" is null) = ("invitations"."accepted_by" is null))
);
--> statement-breakpoint
CREATE TABLE "one_time_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"purpose" "token_purpose" NOT NULL,
	"user_id" uuid,
	"email" text,
	"secret_hash" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"used_at" timestamp (3) with time zone,
	CONSTRAINT "one_time_tokens_of_somebody" CHECK (("one_time_tokens"."purpose" = 'first-group') = ("one_time_tokens"."user_id" is null)),
	CONSTRAINT "one_time_tokens_secret_sha256" CHECK ("one_time_tokens"."secret_hash" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
DROP INDEX "sessions_member";--> statement-breakpoint
ALTER TABLE "users" ALTER COLUMN "password_hash" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "sessions" ADD COLUMN "user_agent" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "sessions" ADD COLUMN "address" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "users" ADD COLUMN "email_verified_at" timestamp (3) with time zone;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_accepted_by_users_id_fk" FOREIGN KEY ("accepted_by") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_inviter_fk" FOREIGN KEY ("group_id","invited_by") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "one_time_tokens" ADD CONSTRAINT "one_time_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "attempts_of_budget" ON "attempts" USING btree ("budget","at");--> statement-breakpoint
CREATE INDEX "attempts_by_age" ON "attempts" USING btree ("at");--> statement-breakpoint
CREATE INDEX "invitations_newest_first" ON "invitations" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "one_time_tokens_person" ON "one_time_tokens" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_person" ON "sessions" USING btree ("user_id");