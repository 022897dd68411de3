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
ALTER TABLE "revisions" ADD COLUMN "model" jsonb DEFAULT '{"repulsion":{"kind":"born_lande","exponent":{"from":"ions"}},"measured":{"latticeEnergyKjPerMol":null,"bulkModulusGpa":null,"source":""},"formation":{"typedKjPerMol":{},"excluded":[],"solveFor":"formation","lattice":"model"}}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "data_values" ADD CONSTRAINT "data_values_workspace_fk" FOREIGN KEY ("workspace_id") REFERENCES "public"."workspaces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "data_values" ADD CONSTRAINT "data_values_set_by_fk" FOREIGN KEY ("set_by_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "drafts" ADD CONSTRAINT "drafts_json" CHECK (jsonb_typeof("drafts"."cell") = 'object' and jsonb_typeof("drafts"."method") = 'object' and jsonb_typeof("drafts"."model") = 'object');--> statement-breakpoint
ALTER TABLE "revisions" ADD CONSTRAINT "revisions_json" CHECK (jsonb_typeof("revisions"."cell") = 'object' and jsonb_typeof("revisions"."method") = 'object' and jsonb_typeof("revisions"."model") = 'object' and jsonb_typeof(coalesce("revisions"."evaluation_problem", '{}')) = 'object');--> statement-breakpoint
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
