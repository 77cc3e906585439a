CREATE TABLE "edition_memories" (
	"edition_id" uuid NOT NULL,
	"group_id" text NOT NULL,
	"material" "material" NOT NULL,
	"process_gas" "process_gas" NOT NULL,
	"band_index" integer NOT NULL,
	"nozzle_mm" double precision NOT NULL,
	"memory" jsonb NOT NULL,
	CONSTRAINT "edition_memories_edition_id_group_id_pk" PRIMARY KEY("edition_id","group_id")
);
--> statement-breakpoint
ALTER TABLE "edition_memories" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "edition_memories" ADD CONSTRAINT "edition_memories_edition_id_editions_id_fk" FOREIGN KEY ("edition_id") REFERENCES "public"."editions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "edition_builds_one_open" ON "edition_builds" USING btree ((true)) WHERE "edition_builds"."state" in ('queued', 'running');--> statement-breakpoint
CREATE POLICY "audit_log_builder" ON "audit_log" AS PERMISSIVE FOR INSERT TO "edition_builder" WITH CHECK (actor_id is null);--> statement-breakpoint
CREATE POLICY "edition_memories_builder" ON "edition_memories" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
DROP POLICY "edition_ledger_builder" ON "edition_ledger" CASCADE;--> statement-breakpoint
DROP TABLE "edition_ledger" CASCADE;--> statement-breakpoint
-- What the generated part cannot say: the builder's rights, on this and for what is published from the command line.
GRANT SELECT, INSERT, DELETE ON edition_memories TO edition_builder;--> statement-breakpoint
GRANT INSERT ON audit_log TO edition_builder;
