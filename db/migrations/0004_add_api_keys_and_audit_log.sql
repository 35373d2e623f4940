CREATE TYPE "public"."key_scope" AS ENUM('read', 'compute', 'write');--> statement-breakpoint
CREATE TABLE "api_keys" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"name" text NOT NULL,
	"scope" "key_scope" NOT NULL,
	"secret_hash" text NOT NULL,
	"beginning" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp (3) with time zone NOT NULL,
	"last_used_at" timestamp (3) with time zone,
	"revoked_at" timestamp (3) with time zone,
	"requests_per_minute" integer,
	CONSTRAINT "api_keys_secret_hash_unique" UNIQUE("secret_hash"),
	CONSTRAINT "api_keys_secret_sha256" CHECK ("api_keys"."secret_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "api_keys_rate_positive" CHECK ("api_keys"."requests_per_minute" > 0)
);
--> statement-breakpoint
CREATE TABLE "audit_entries" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"group_id" uuid NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL,
	"actor_id" uuid,
	"api_key_id" uuid,
	"action" text NOT NULL,
	"subject_id" uuid,
	"detail" jsonb NOT NULL,
	"from_address" text,
	"from_agent" text,
	"request_id" text
);
--> statement-breakpoint
ALTER TABLE "api_keys" ADD CONSTRAINT "api_keys_member_fk" FOREIGN KEY ("group_id","user_id") REFERENCES "public"."memberships"("group_id","user_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "api_keys_newest_first" ON "api_keys" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "audit_entries_newest_first" ON "audit_entries" USING btree ("group_id","created_at","id");--> statement-breakpoint
CREATE INDEX "audit_entries_of_actor" ON "audit_entries" USING btree ("group_id","actor_id","created_at","id");--> statement-breakpoint
CREATE INDEX "audit_entries_of_subject" ON "audit_entries" USING btree ("group_id","subject_id","created_at","id");