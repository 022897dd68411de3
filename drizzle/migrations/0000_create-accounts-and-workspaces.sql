CREATE TYPE "public"."workspace_role" AS ENUM('owner', 'crystallographer', 'reviewer', 'reader');--> statement-breakpoint
CREATE TABLE "audit_events" (
	"id" uuid PRIMARY KEY NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"workspace_id" uuid,
	"actor_id" uuid,
	"action" text NOT NULL,
	"subject" text,
	"detail" text,
	"address" text,
	CONSTRAINT "audit_events_action_form" CHECK ("audit_events"."action" ~ '^[a-z_]+\.[a-z_]+$')
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"sid" text PRIMARY KEY NOT NULL,
	"sess" jsonb NOT NULL,
	"expire" timestamp with time zone NOT NULL,
	"id" uuid GENERATED ALWAYS AS ((sess ->> 'publicId')::uuid) STORED NOT NULL,
	"user_id" uuid GENERATED ALWAYS AS ((sess ->> 'userId')::uuid) STORED NOT NULL,
	CONSTRAINT "sessions_id" UNIQUE("id"),
	CONSTRAINT "sessions_sid_form" CHECK ("sessions"."sid" ~ '^[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempts" (
	"key" text PRIMARY KEY NOT NULL,
	"failures" integer NOT NULL,
	"last_at" timestamp with time zone NOT NULL,
	"blocked_until" timestamp with time zone NOT NULL,
	CONSTRAINT "sign_in_attempts_failures_count" CHECK ("sign_in_attempts"."failures" >= 0),
	CONSTRAINT "sign_in_attempts_key_form" CHECK ("sign_in_attempts"."key" ~ '^(account|address|browser):[0-9a-f]{64}$')
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"password_hash" text NOT NULL,
	"password_changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_name_length" CHECK (char_length(btrim("users"."name")) between 1 and 80),
	CONSTRAINT "users_email_form" CHECK (char_length("users"."email") between 3 and 254 and "users"."email" like '%_@_%'),
	CONSTRAINT "users_password_hash_form" CHECK ("users"."password_hash" like '$argon2id$%')
);
--> statement-breakpoint
CREATE TABLE "installation" (
	"is_only_row" boolean PRIMARY KEY DEFAULT true NOT NULL,
	"demo_notice" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "installation_one_row" CHECK ("installation"."is_only_row")
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"email" text NOT NULL,
	"role" "workspace_role" NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"accepted_by_id" uuid,
	"withdrawn_at" timestamp with time zone,
	CONSTRAINT "invitations_token_hash" UNIQUE("token_hash"),
	CONSTRAINT "invitations_email_form" CHECK (char_length("invitations"."email") between 3 and 254 and "invitations"."email" like '%_@_%'),
	CONSTRAINT "invitations_token_hash_form" CHECK ("invitations"."token_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "invitations_end_once" CHECK ("invitations"."accepted_at" is null or "invitations"."withdrawn_at" is null),
	CONSTRAINT "invitations_expires_later" CHECK ("invitations"."expires_at" > "invitations"."created_at")
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"workspace_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"role" "workspace_role" NOT NULL,
	"joined_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_pkey" PRIMARY KEY("workspace_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "workspaces" (
	"id" uuid PRIMARY KEY NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"readers_may_comment" boolean DEFAULT true NOT NULL,
	"requires_second_person" boolean DEFAULT true NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "workspaces_slug" UNIQUE("slug"),
	CONSTRAINT "workspaces_slug_form" CHECK ("workspaces"."slug" ~ '^[a-z0-9]([a-z0-9-]{0,46}[a-z0-9])?$'),
	CONSTRAINT "workspaces_name_length" CHECK (char_length(btrim("workspaces"."name")) between 1 and 80)
);
--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_events" ADD CONSTRAINT "audit_events_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_invited_by_id_users_id_fk" FOREIGN KEY ("invited_by_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_accepted_by_id_users_id_fk" FOREIGN KEY ("accepted_by_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_events_workspace_at" ON "audit_events" USING btree ("workspace_id","at","id");--> statement-breakpoint
CREATE INDEX "audit_events_actor" ON "audit_events" USING btree ("actor_id");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_expire" ON "sessions" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "sign_in_attempts_last_at" ON "sign_in_attempts" USING btree ("last_at");--> statement-breakpoint
CREATE UNIQUE INDEX "users_email" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_open" ON "invitations" USING btree ("workspace_id",lower("email")) WHERE "invitations"."accepted_at" is null and "invitations"."withdrawn_at" is null;--> statement-breakpoint
CREATE INDEX "invitations_invited_by" ON "invitations" USING btree ("invited_by_id");--> statement-breakpoint
CREATE INDEX "memberships_user" ON "memberships" USING btree ("user_id");--> statement-breakpoint
-- From here on by hand: a workspace keeps an owner, whoever leaves at the same moment. The lock on
-- the workspace makes such changes wait for each other; the check runs when a transaction ends.
CREATE FUNCTION keep_workspace_owner() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
	PERFORM 1 FROM workspaces WHERE id = OLD.workspace_id FOR NO KEY UPDATE;
	IF FOUND AND NOT EXISTS (
		SELECT 1 FROM memberships WHERE workspace_id = OLD.workspace_id AND role = 'owner'
	) THEN
		RAISE EXCEPTION 'workspace % would be without an owner', OLD.workspace_id
			USING ERRCODE = 'check_violation', CONSTRAINT = 'memberships_keep_owner', TABLE = 'memberships';
	END IF;
	RETURN NULL;
END;
$$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER memberships_keep_owner
	AFTER UPDATE OR DELETE ON memberships
	DEFERRABLE INITIALLY DEFERRED
	FOR EACH ROW WHEN (OLD.role = 'owner')
	EXECUTE FUNCTION keep_workspace_owner();
