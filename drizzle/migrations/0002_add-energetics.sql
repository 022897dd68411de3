CREATE TYPE "public"."computation_kind" AS ENUM('relaxation', 'elastic', 'vibrations', 'rivals');--> statement-breakpoint
CREATE TYPE "public"."computation_state" AS ENUM('waiting', 'running', 'done', 'failed', 'cancelled');--> statement-breakpoint
CREATE TABLE "computations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"workspace_id" uuid NOT NULL,
	"kind" "computation_kind" NOT NULL,
	"input_hash" text NOT NULL,
	"input" jsonb NOT NULL,
	"state" "computation_state" DEFAULT 'waiting' NOT NULL,
	"stage" text DEFAULT '' NOT NULL,
	"progress" double precision DEFAULT 0 NOT NULL,
	"seconds_left" double precision,
	"result" jsonb,
	"problem_code" text,
	"problem_message" text,
	"attempts" integer DEFAULT 0 NOT NULL,
	"asked_by_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp with time zone,
	"alive_at" timestamp with time zone,
	"ended_at" timestamp with time zone,
	CONSTRAINT "computations_hash_form" CHECK ("computations"."input_hash" ~ '^[0-9a-f]{64}$'),
	CONSTRAINT "computations_progress_part" CHECK ("computations"."progress" between 0 and 1),
	CONSTRAINT "computations_done_with_result" CHECK (("computations"."state" = 'done') = ("computations"."result" is not null)),
	CONSTRAINT "computations_failed_with_reason" CHECK (("computations"."state" = 'failed') = ("computations"."problem_code" is not null))
);
--> statement-breakpoint
CREATE TABLE "data_values" (
	"workspace_id" uuid NOT NULL,
	"key" text NOT NULL,
	"value" double precision NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"set_by_id" uuid NOT NULL,
	"set_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "data_values_pk" PRIMARY KEY("workspace_id","key"),
	CONSTRAINT "data_values_key_length" CHECK (char_length("data_values"."key") between 1 and 80),
	CONSTRAINT "data_values_finite" CHECK ("data_values"."value" not in ('NaN', 'Infinity', '-Infinity'))
);
--> statement-breakpoint
ALTER TABLE "drafts" DROP CONSTRAINT "drafts_json";--> statement-breakpoint
ALTER TABLE "revisions" DROP CONSTRAINT "revisions_json";--> statement-breakpoint
ALTER TABLE "drafts" ADD COLUMN "model" jsonb DEFAULT '{"repulsion":{"kind":"born_lande","exponent":{"from":"ions"}},"measured":{"latticeEnergyKjPerMol":null,"bulkModulusGpa":null,"source":""},"formation":{"typedKjPerMol":{},"excluded":[],"solveFor":"formation","lattice":"model"}}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "lattices" ADD COLUMN "verdict" jsonb;--> statement-breakpoint
ALTER TABLE "revisions" ADD COLUMN "model" jsonb DEFAULT '{"repulsion":{"kind":"born_lande","exponent":{"from":"ions"}},"measured":{"latticeEnergyKjPerMol":null,"bulkModulusGpa":null,"source":""},"formation":{"typedKjPerMol":{},"excluded":[],"solveFor":"formation","lattice":"model"}}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "workspaces" ADD COLUMN "check_limits" jsonb DEFAULT '{}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "computations" ADD CONSTRAINT "computations_workspace_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "computations" ADD CONSTRAINT "computations_asked_by_fk" FOREIGN KEY ("asked_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_values" ADD CONSTRAINT "data_values_workspace_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_values" ADD CONSTRAINT "data_values_set_by_fk" FOREIGN KEY ("set_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "computations_input" ON "computations" USING btree ("workspace_id","input_hash") WHERE "computations"."state" in ('waiting', 'running', 'done');--> statement-breakpoint
CREATE INDEX "computations_asked" ON "computations" USING btree ("workspace_id","created_at");--> statement-breakpoint
ALTER TABLE "drafts" ADD CONSTRAINT "drafts_json" CHECK (jsonb_typeof("drafts"."cell") = 'object' and jsonb_typeof("drafts"."method") = 'object' and jsonb_typeof("drafts"."model") = 'object');--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_json" CHECK (jsonb_typeof("revisions"."cell") = 'object' and jsonb_typeof("revisions"."method") = 'object' and jsonb_typeof("revisions"."model") = 'object' and jsonb_typeof(coalesce("revisions"."evaluation_problem", '{}')) = 'object');--> statement-breakpoint
ALTER TABLE "workspaces" ADD CONSTRAINT "workspaces_check_limits_json" CHECK (jsonb_typeof("workspaces"."check_limits") = 'object');--> statement-breakpoint
-- The model is part of what a revision says.
DROP TRIGGER revisions_immutable ON revisions;
--> statement-breakpoint
CREATE TRIGGER revisions_immutable
	BEFORE UPDATE ON revisions
	FOR EACH ROW WHEN (
		(OLD.id, OLD.workspace_id, OLD.lattice_id, OLD.number, OLD.note, OLD.author_id, OLD.created_at,
			OLD.cell, OLD.method, OLD.model, OLD.formula, OLD.evaluation_hash, OLD.evaluation_problem,
			OLD.energy_ev_per_formula_unit, OLD.energy_bound_ev_per_formula_unit)
		IS DISTINCT FROM
		(NEW.id, NEW.workspace_id, NEW.lattice_id, NEW.number, NEW.note, NEW.author_id, NEW.created_at,
			NEW.cell, NEW.method, NEW.model, NEW.formula, NEW.evaluation_hash, NEW.evaluation_problem,
			NEW.energy_ev_per_formula_unit, NEW.energy_bound_ev_per_formula_unit)
	)
	EXECUTE FUNCTION refuse_change();
--> statement-breakpoint
-- A result is written once.
CREATE TRIGGER computations_done_immutable
	BEFORE UPDATE ON computations
	FOR EACH ROW WHEN (OLD.state = 'done')
	EXECUTE FUNCTION refuse_change();
