CREATE TYPE "public"."member_role" AS ENUM('lead', 'author', 'reader');--> statement-breakpoint
CREATE TABLE "candidate_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"candidate_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"parent_id" uuid,
	"author_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"note" text NOT NULL,
	"digest" text NOT NULL,
	"input" jsonb NOT NULL,
	CONSTRAINT "candidate_revisions_number_unique" UNIQUE("group_id","candidate_id","number"),
	CONSTRAINT "candidate_revisions_group_id_unique" UNIQUE("group_id","id"),
	CONSTRAINT "candidate_revisions_record_id_unique" UNIQUE("group_id","candidate_id","id"),
	CONSTRAINT "candidate_revisions_number_positive" CHECK ("candidate_revisions"."number" >= 1),
	CONSTRAINT "candidate_revisions_first_has_no_parent" CHECK (("candidate_revisions"."number" = 1) = ("candidate_revisions"."parent_id" is null)),
	CONSTRAINT "candidate_revisions_no_own_parent" CHECK ("candidate_revisions"."parent_id" <> "candidate_revisions"."id"),
	CONSTRAINT "candidate_revisions_digest_sha256" CHECK ("candidate_revisions"."digest" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "candidates" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"latest_number" integer NOT NULL,
	CONSTRAINT "candidates_group_id_unique" UNIQUE("group_id","id"),
	CONSTRAINT "candidates_latest_number_positive" CHECK ("candidates"."latest_number" >= 1)
);
--> statement-breakpoint
CREATE TABLE "evaluations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"history_id" uuid NOT NULL,
	"history_revision_id" uuid NOT NULL,
	"candidate_id" uuid NOT NULL,
	"candidate_revision_id" uuid NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"core_version" text NOT NULL,
	"input_digest" text NOT NULL,
	"omega_h2" double precision NOT NULL,
	"result" jsonb NOT NULL,
	CONSTRAINT "evaluations_digest_sha256" CHECK ("evaluations"."input_digest" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "groups" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"baseline_revision_id" uuid,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "histories" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"latest_number" integer NOT NULL,
	CONSTRAINT "histories_group_id_unique" UNIQUE("group_id","id"),
	CONSTRAINT "histories_latest_number_positive" CHECK ("histories"."latest_number" >= 1)
);
--> statement-breakpoint
CREATE TABLE "history_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"history_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"parent_id" uuid,
	"author_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"note" text NOT NULL,
	"digest" text NOT NULL,
	"input" jsonb NOT NULL,
	CONSTRAINT "history_revisions_number_unique" UNIQUE("group_id","history_id","number"),
	CONSTRAINT "history_revisions_group_id_unique" UNIQUE("group_id","id"),
	CONSTRAINT "history_revisions_record_id_unique" UNIQUE("group_id","history_id","id"),
	CONSTRAINT "history_revisions_number_positive" CHECK ("history_revisions"."number" >= 1),
	CONSTRAINT "history_revisions_first_has_no_parent" CHECK (("history_revisions"."number" = 1) = ("history_revisions"."parent_id" is null)),
	CONSTRAINT "history_revisions_no_own_parent" CHECK ("history_revisions"."parent_id" <> "history_revisions"."id"),
	CONSTRAINT "history_revisions_digest_sha256" CHECK ("history_revisions"."digest" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"group_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"role" "member_role" NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_pk" PRIMARY KEY("group_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"last_used_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"revoked_at" timestamp (3) with time zone
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_email_unique" UNIQUE("email"),
	CONSTRAINT "users_email_lower_case" CHECK ("users"."email" = lower("users"."email")),
	CONSTRAINT "users_password_argon2id" CHECK ("users"."password_hash" like '$argon2id$%')
);
--> statement-breakpoint
ALTER TABLE "candidate_revisions" ADD CONSTRAINT "candidate_revisions_record_fk" FOREIGN KEY ("group_id","candidate_id") REFERENCES "public"."candidates"("group_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_revisions" ADD CONSTRAINT "candidate_revisions_parent_fk" FOREIGN KEY ("group_id","candidate_id","parent_id") REFERENCES "public"."candidate_revisions"("group_id","candidate_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidate_revisions" ADD CONSTRAINT "candidate_revisions_author_fk" FOREIGN KEY ("group_id","author_id") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "candidates" ADD CONSTRAINT "candidates_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_history_revision_fk" FOREIGN KEY ("group_id","history_id","history_revision_id") REFERENCES "public"."history_revisions"("group_id","history_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_candidate_revision_fk" FOREIGN KEY ("group_id","candidate_id","candidate_revision_id") REFERENCES "public"."candidate_revisions"("group_id","candidate_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluations" ADD CONSTRAINT "evaluations_author_fk" FOREIGN KEY ("group_id","author_id") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "histories" ADD CONSTRAINT "histories_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "history_revisions" ADD CONSTRAINT "history_revisions_record_fk" FOREIGN KEY ("group_id","history_id") REFERENCES "public"."histories"("group_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "history_revisions" ADD CONSTRAINT "history_revisions_parent_fk" FOREIGN KEY ("group_id","history_id","parent_id") REFERENCES "public"."history_revisions"("group_id","history_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "history_revisions" ADD CONSTRAINT "history_revisions_author_fk" FOREIGN KEY ("group_id","author_id") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_group_id_groups_id_fk" FOREIGN KEY ("group_id") REFERENCES "public"."groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_member_fk" FOREIGN KEY ("group_id","user_id") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "candidates_newest_first" ON "candidates" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "evaluations_newest_first" ON "evaluations" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "evaluations_of_history" ON "evaluations" USING btree ("group_id","history_id","created_at","id");--> statement-breakpoint
CREATE INDEX "evaluations_of_candidate" ON "evaluations" USING btree ("group_id","candidate_id","created_at","id");--> statement-breakpoint
CREATE INDEX "histories_newest_first" ON "histories" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "memberships_user" ON "memberships" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_member" ON "sessions" USING btree ("group_id","user_id");