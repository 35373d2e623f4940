CREATE TABLE "signing_keys" (
	"kid" text PRIMARY KEY NOT NULL,
	"sealed_jwk" text NOT NULL,
	"created_at" timestamp (3) with time zone DEFAULT now() NOT NULL
);
