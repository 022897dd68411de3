CREATE TYPE "public"."revision_state" AS ENUM('draft', 'in_review', 'accepted', 'returned');--> statement-breakpoint
CREATE TYPE "public"."annotation_anchor" AS ENUM('revision', 'site', 'pair');--> statement-breakpoint
CREATE TABLE "evaluation_uses" (
	"workspace_id" uuid NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "evaluation_uses_pkey" PRIMARY KEY("workspace_id","hash")
);
--> statement-breakpoint
CREATE TABLE "evaluations" (
	"hash" text PRIMARY KEY NOT NULL,
	"engine" text NOT NULL,
	"method" jsonb NOT NULL,
	"result" jsonb NOT NULL,
	"computed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"duration_ms" double precision NOT NULL,
	CONSTRAINT "evaluations_hash_form" CHECK ("evaluations"."hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "evaluations_json" CHECK (jsonb_typeof("evaluations"."method") = 'object' and jsonb_typeof("evaluations"."result") = 'object'),
	CONSTRAINT "evaluations_duration" CHECK ("evaluations"."duration_ms" >= 0)
);
--> statement-breakpoint
CREATE TABLE "drafts" (
	"lattice_id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"base_revision" integer NOT NULL,
	"version" integer NOT NULL,
	"cell" jsonb NOT NULL,
	"method" jsonb NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_by_id" uuid NOT NULL,
	CONSTRAINT "drafts_counts" CHECK ("drafts"."base_revision" >= 0 and "drafts"."version" >= 1),
	CONSTRAINT "drafts_json" CHECK (jsonb_typeof("drafts"."cell") = 'object' and jsonb_typeof("drafts"."method") = 'object')
);
--> statement-breakpoint
CREATE TABLE "lattices" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"name" text NOT NULL,
	"tags" text[] DEFAULT '{}' NOT NULL,
	"prototype" text,
	"author_id" uuid NOT NULL,
	"state" "revision_state" DEFAULT 'draft' NOT NULL,
	"head_revision" integer DEFAULT 0 NOT NULL,
	"draft_version" integer DEFAULT 0 NOT NULL,
	"formula" text,
	"space_group_number" integer,
	"space_group_symbol" text,
	"madelung_reduced" double precision,
	"madelung_reduced_bound" double precision,
	"energy_ev_per_formula_unit" double precision,
	"energy_bound_ev_per_formula_unit" double precision,
	"problem_code" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"deleted_at" timestamp with time zone,
	CONSTRAINT "lattices_workspace_id" UNIQUE("workspace_id","id"),
	CONSTRAINT "lattices_name_length" CHECK (char_length(btrim("lattices"."name")) between 1 and 120),
	CONSTRAINT "lattices_tags_count" CHECK (cardinality("lattices"."tags") <= 12),
	CONSTRAINT "lattices_counts" CHECK ("lattices"."head_revision" >= 0 and "lattices"."draft_version" >= 0),
	CONSTRAINT "lattices_state_of_head" CHECK ("lattices"."head_revision" > 0 or "lattices"."state" = 'draft'),
	CONSTRAINT "lattices_bounds" CHECK (("lattices"."madelung_reduced" is null) = ("lattices"."madelung_reduced_bound" is null) and ("lattices"."energy_ev_per_formula_unit" is null) = ("lattices"."energy_bound_ev_per_formula_unit" is null))
);
--> statement-breakpoint
CREATE TABLE "revisions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"lattice_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"cell" jsonb NOT NULL,
	"method" jsonb NOT NULL,
	"formula" text NOT NULL,
	"evaluation_hash" text,
	"evaluation_problem" jsonb,
	"energy_ev_per_formula_unit" double precision,
	"energy_bound_ev_per_formula_unit" double precision,
	"state" "revision_state" DEFAULT 'draft' NOT NULL,
	"submitted_by_id" uuid,
	"submitted_at" timestamp with time zone,
	"decided_by_id" uuid,
	"decided_at" timestamp with time zone,
	"decision_reason" text,
	CONSTRAINT "revisions_number" UNIQUE("lattice_id","number"),
	CONSTRAINT "revisions_workspace_id" UNIQUE("workspace_id","id"),
	CONSTRAINT "revisions_number_counts" CHECK ("revisions"."number" >= 1),
	CONSTRAINT "revisions_json" CHECK (jsonb_typeof("revisions"."cell") = 'object' and jsonb_typeof("revisions"."method") = 'object' and jsonb_typeof(coalesce("revisions"."evaluation_problem", '{}')) = 'object'),
	CONSTRAINT "revisions_evaluated_or_why_not" CHECK (num_nonnulls("revisions"."evaluation_hash", "revisions"."evaluation_problem") = 1 and ("revisions"."energy_ev_per_formula_unit" is null) = ("revisions"."energy_bound_ev_per_formula_unit" is null)),
	CONSTRAINT "revisions_submitted" CHECK (("revisions"."submitted_by_id" is null) = ("revisions"."submitted_at" is null) and ("revisions"."state" = 'draft' or "revisions"."submitted_at" is not null)),
	CONSTRAINT "revisions_decided" CHECK (("revisions"."decided_by_id" is null) = ("revisions"."decided_at" is null) and ("revisions"."state" in ('accepted', 'returned')) = ("revisions"."decided_at" is not null)),
	CONSTRAINT "revisions_returned_with_reason" CHECK ("revisions"."state" <> 'returned' or btrim(coalesce("revisions"."decision_reason", '')) <> '')
);
--> statement-breakpoint
CREATE TABLE "annotation_replies" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"annotation_id" uuid NOT NULL,
	"text" text NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "annotation_replies_text_length" CHECK (char_length("annotation_replies"."text") between 1 and 4000)
);
--> statement-breakpoint
CREATE TABLE "annotations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"anchor_kind" "annotation_anchor" NOT NULL,
	"anchor_target" text,
	"text" text NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"resolved_at" timestamp with time zone,
	"resolved_by_id" uuid,
	CONSTRAINT "annotations_number" UNIQUE("revision_id","number"),
	CONSTRAINT "annotations_workspace_id" UNIQUE("workspace_id","id"),
	CONSTRAINT "annotations_number_counts" CHECK ("annotations"."number" >= 1),
	CONSTRAINT "annotations_anchor_target" CHECK (("annotations"."anchor_kind" = 'revision') = ("annotations"."anchor_target" is null)),
	CONSTRAINT "annotations_text_length" CHECK (char_length("annotations"."text") between 1 and 4000),
	CONSTRAINT "annotations_resolved" CHECK (("annotations"."resolved_at" is null) = ("annotations"."resolved_by_id" is null))
);
--> statement-breakpoint
CREATE TABLE "shares" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"created_by_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	"opened_count" integer DEFAULT 0 NOT NULL,
	"last_opened_at" timestamp with time zone,
	CONSTRAINT "shares_token_hash" UNIQUE("token_hash"),
	CONSTRAINT "shares_token_hash_form" CHECK ("shares"."token_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "shares_expires_later" CHECK ("shares"."expires_at" > "shares"."created_at"),
	CONSTRAINT "shares_opened" CHECK ("shares"."opened_count" >= 0 and ("shares"."opened_count" = 0) = ("shares"."last_opened_at" is null))
);
--> statement-breakpoint
ALTER TABLE "evaluation_uses" ADD CONSTRAINT "evaluation_uses_workspace_id_workspaces_id_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "evaluation_uses" ADD CONSTRAINT "evaluation_uses_hash_evaluations_hash_fk" FOREIGN KEY ("hash") REFERENCES "public"."evaluations"("hash") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "drafts" ADD CONSTRAINT "drafts_lattice_fk" FOREIGN KEY ("workspace_id","lattice_id") REFERENCES "public"."lattices"("workspace_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "drafts" ADD CONSTRAINT "drafts_updated_by_fk" FOREIGN KEY ("updated_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lattices" ADD CONSTRAINT "lattices_workspace_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lattices" ADD CONSTRAINT "lattices_author_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_lattice_fk" FOREIGN KEY ("workspace_id","lattice_id") REFERENCES "public"."lattices"("workspace_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_author_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_evaluation_fk" FOREIGN KEY ("evaluation_hash") REFERENCES "public"."evaluations"("hash") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_submitted_by_fk" FOREIGN KEY ("submitted_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_decided_by_fk" FOREIGN KEY ("decided_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotation_replies" ADD CONSTRAINT "annotation_replies_annotation_fk" FOREIGN KEY ("workspace_id","annotation_id") REFERENCES "public"."annotations"("workspace_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotation_replies" ADD CONSTRAINT "annotation_replies_author_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotations" ADD CONSTRAINT "annotations_revision_fk" FOREIGN KEY ("workspace_id","revision_id") REFERENCES "public"."revisions"("workspace_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotations" ADD CONSTRAINT "annotations_author_fk" FOREIGN KEY ("author_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "annotations" ADD CONSTRAINT "annotations_resolved_by_fk" FOREIGN KEY ("resolved_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "shares" ADD CONSTRAINT "shares_revision_fk" FOREIGN KEY ("workspace_id","revision_id") REFERENCES "public"."revisions"("workspace_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "shares" ADD CONSTRAINT "shares_created_by_fk" FOREIGN KEY ("created_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "evaluation_uses_hash" ON "evaluation_uses" USING btree ("hash");--> statement-breakpoint
CREATE INDEX "evaluations_computed" ON "evaluations" USING btree ("computed_at");--> statement-breakpoint
CREATE INDEX "lattices_shelf" ON "lattices" USING btree ("workspace_id","updated_at");--> statement-breakpoint
CREATE INDEX "lattices_author" ON "lattices" USING btree ("author_id");--> statement-breakpoint
CREATE INDEX "lattices_deleted" ON "lattices" USING btree ("deleted_at") WHERE "lattices"."deleted_at" is not null;--> statement-breakpoint
CREATE UNIQUE INDEX "revisions_one_in_review" ON "revisions" USING btree ("lattice_id") WHERE "revisions"."state" = 'in_review';--> statement-breakpoint
CREATE INDEX "revisions_evaluation" ON "revisions" USING btree ("evaluation_hash");--> statement-breakpoint
CREATE INDEX "annotation_replies_annotation" ON "annotation_replies" USING btree ("annotation_id");--> statement-breakpoint
CREATE INDEX "shares_revision" ON "shares" USING btree ("revision_id");--> statement-breakpoint
-- From here on by hand: a result stays what it was when it was kept.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
	RAISE EXCEPTION 'rows of % do not change', TG_TABLE_NAME
		USING ERRCODE = 'check_violation', CONSTRAINT = TG_NAME, TABLE = TG_TABLE_NAME;
END;
$$;
--> statement-breakpoint
CREATE TRIGGER evaluations_immutable
	BEFORE UPDATE ON evaluations
	FOR EACH ROW EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
-- A revision stays what it was when it was saved; only its way through review is still to come.
CREATE TRIGGER revisions_immutable
	BEFORE UPDATE ON revisions
	FOR EACH ROW WHEN (
		(OLD.id, OLD.workspace_id, OLD.lattice_id, OLD.number, OLD.note, OLD.author_id, OLD.created_at,
			OLD.cell, OLD.method, OLD.formula, OLD.evaluation_hash, OLD.evaluation_problem,
			OLD.energy_ev_per_formula_unit, OLD.energy_bound_ev_per_formula_unit)
		IS DISTINCT FROM
		(NEW.id, NEW.workspace_id, NEW.lattice_id, NEW.number, NEW.note, NEW.author_id, NEW.created_at,
			NEW.cell, NEW.method, NEW.formula, NEW.evaluation_hash, NEW.evaluation_problem,
			NEW.energy_ev_per_formula_unit, NEW.energy_bound_ev_per_formula_unit)
	)
	EXECUTE FUNCTION refuse_change();
