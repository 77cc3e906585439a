CREATE TYPE "public"."application_state" AS ENUM('waiting', 'admitted', 'declined');--> statement-breakpoint
CREATE TYPE "public"."build_state" AS ENUM('queued', 'running', 'done', 'failed');--> statement-breakpoint
CREATE TYPE "public"."edition_state" AS ENUM('built', 'published', 'discarded');--> statement-breakpoint
CREATE TYPE "public"."dryness" AS ENUM('untreated', 'separator', 'refrigerated', 'desiccant');--> statement-breakpoint
CREATE TYPE "public"."height_control" AS ENUM('none', 'manual', 'arc-voltage', 'capacitive');--> statement-breakpoint
CREATE TYPE "public"."start_method" AS ENUM('high-frequency', 'contact');--> statement-breakpoint
CREATE TYPE "public"."member_role" AS ENUM('owner', 'operator');--> statement-breakpoint
CREATE TYPE "public"."material" AS ENUM('mild-steel', 'galvanised-steel', 'stainless-steel', 'aluminium', 'copper', 'brass');--> statement-breakpoint
CREATE TYPE "public"."process_gas" AS ENUM('air', 'oxygen', 'nitrogen', 'argon-hydrogen');--> statement-breakpoint
CREATE TYPE "public"."surface" AS ENUM('clean', 'mill-scale', 'rust', 'paint', 'corrugated', 'expanded');--> statement-breakpoint
CREATE TYPE "public"."recipe_state" AS ENUM('draft', 'proven', 'retired');--> statement-breakpoint
CREATE TYPE "public"."share_level" AS ENUM('counted', 'listed');--> statement-breakpoint
CREATE TYPE "public"."shop_state" AS ENUM('active', 'suspended');--> statement-breakpoint
CREATE TYPE "public"."dross" AS ENUM('none', 'light', 'moderate', 'heavy');--> statement-breakpoint
CREATE TYPE "public"."top_edge" AS ENUM('square', 'slightly-rounded', 'rounded', 'melted');--> statement-breakpoint
CREATE TYPE "public"."theme" AS ENUM('system', 'light', 'dark');--> statement-breakpoint
CREATE TYPE "public"."unit_system" AS ENUM('metric', 'inch');--> statement-breakpoint
CREATE TABLE "applications" (
	"id" uuid PRIMARY KEY NOT NULL,
	"shop_name" text NOT NULL,
	"place" text NOT NULL,
	"contact_name" text NOT NULL,
	"email" text NOT NULL,
	"machines" integer NOT NULL,
	"about" text NOT NULL,
	"state" "application_state" DEFAULT 'waiting' NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"decided_at" timestamp with time zone,
	"decided_by" uuid,
	"shop_id" uuid
);
--> statement-breakpoint
ALTER TABLE "applications" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "audit_log" (
	"id" bigint PRIMARY KEY GENERATED ALWAYS AS IDENTITY (sequence name "audit_log_id_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 9223372036854775807 START WITH 1 CACHE 1),
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"actor_id" uuid,
	"action" text NOT NULL,
	"subject_id" uuid,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL
);
--> statement-breakpoint
ALTER TABLE "audit_log" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "contributing_machines" (
	"machine_id" uuid PRIMARY KEY NOT NULL,
	"number" bigint NOT NULL,
	CONSTRAINT "contributing_machines_number_unique" UNIQUE("number")
);
--> statement-breakpoint
ALTER TABLE "contributing_machines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "contributors" (
	"shop_id" uuid PRIMARY KEY NOT NULL,
	"number" bigint NOT NULL,
	CONSTRAINT "contributors_number_unique" UNIQUE("number")
);
--> statement-breakpoint
ALTER TABLE "contributors" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "edition_builds" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"state" "build_state" DEFAULT 'queued' NOT NULL,
	"groups_done" integer DEFAULT 0 NOT NULL,
	"groups_total" integer,
	"message" text DEFAULT '' NOT NULL,
	"edition_id" uuid,
	"requested_by" uuid,
	"requested_at" timestamp with time zone DEFAULT now() NOT NULL,
	"started_at" timestamp with time zone,
	"finished_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "edition_builds" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "edition_groups" (
	"edition_id" uuid NOT NULL,
	"group_id" text NOT NULL,
	"material" "material" NOT NULL,
	"process_gas" "process_gas" NOT NULL,
	"band_index" integer NOT NULL,
	"nozzle_mm" double precision NOT NULL,
	"figures" jsonb NOT NULL,
	CONSTRAINT "edition_groups_edition_id_group_id_pk" PRIMARY KEY("edition_id","group_id")
);
--> statement-breakpoint
ALTER TABLE "edition_groups" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "edition_ledger" (
	"edition_id" uuid NOT NULL,
	"group_id" text NOT NULL,
	"contributor" bigint NOT NULL,
	"digest" text NOT NULL,
	CONSTRAINT "edition_ledger_edition_id_group_id_contributor_pk" PRIMARY KEY("edition_id","group_id","contributor")
);
--> statement-breakpoint
ALTER TABLE "edition_ledger" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "listed_recipes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"edition_id" uuid NOT NULL,
	"group_id" text NOT NULL,
	"recipe" jsonb NOT NULL
);
--> statement-breakpoint
ALTER TABLE "listed_recipes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "editions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer NOT NULL,
	"state" "edition_state" DEFAULT 'built' NOT NULL,
	"digest" text NOT NULL,
	"parameters" jsonb NOT NULL,
	"network_figures" jsonb NOT NULL,
	"changes" jsonb NOT NULL,
	"built_at" timestamp with time zone DEFAULT now() NOT NULL,
	"published_at" timestamp with time zone,
	"published_by" uuid,
	CONSTRAINT "editions_number_unique" UNIQUE("number")
);
--> statement-breakpoint
ALTER TABLE "editions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"shop_id" uuid NOT NULL,
	"email" text NOT NULL,
	"role" "member_role" NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"accepted_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "machines" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"shop_id" uuid NOT NULL,
	"name" text NOT NULL,
	"power_source_max_current_a" double precision NOT NULL,
	"start_method" "start_method" NOT NULL,
	"torch_pressure_bar" double precision,
	"dryness" "dryness" NOT NULL,
	"height_control" "height_control" NOT NULL,
	"height_control_sample_hz" double precision,
	"top_feed_mm_min" double precision NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "machines_name" UNIQUE("shop_id","name"),
	CONSTRAINT "machines_id_shop" UNIQUE("id","shop_id"),
	CONSTRAINT "machines_current" CHECK (power_source_max_current_a between 10 and 400),
	CONSTRAINT "machines_pressure" CHECK (torch_pressure_bar between 2 and 9),
	CONSTRAINT "machines_sample_rate" CHECK (height_control_sample_hz between 0.1 and 100000),
	CONSTRAINT "machines_top_feed" CHECK (top_feed_mm_min between 50 and 100000)
);
--> statement-breakpoint
ALTER TABLE "machines" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "memberships" (
	"user_id" uuid PRIMARY KEY NOT NULL,
	"shop_id" uuid NOT NULL,
	"role" "member_role" NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "recipe_versions" (
	"recipe_id" uuid NOT NULL,
	"shop_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"machine_id" uuid NOT NULL,
	"material" "material" NOT NULL,
	"grade" text DEFAULT '' NOT NULL,
	"surface" "surface" NOT NULL,
	"process_gas" "process_gas" NOT NULL,
	"thickness_mm" double precision NOT NULL,
	"nozzle_mm" double precision NOT NULL,
	"current_a" double precision,
	"pressure_bar" double precision,
	"feed_mm_min" double precision,
	"cut_height_mm" double precision,
	"pierce_height_mm" double precision,
	"pierce_delay_s" double precision,
	"arc_voltage_v" double precision,
	"kerf_width_mm" double precision,
	"note" text DEFAULT '' NOT NULL,
	"reason" text DEFAULT '' NOT NULL,
	"origin" jsonb NOT NULL,
	"changed_by" uuid,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"proven_at" timestamp with time zone,
	CONSTRAINT "recipe_versions_recipe_id_number_pk" PRIMARY KEY("recipe_id","number"),
	CONSTRAINT "recipe_versions_thickness" CHECK (thickness_mm between 0.4 and 50),
	CONSTRAINT "recipe_versions_nozzle" CHECK (nozzle_mm between 0.4 and 3),
	CONSTRAINT "recipe_versions_current" CHECK (current_a between 10 and 400),
	CONSTRAINT "recipe_versions_pressure" CHECK (pressure_bar between 2 and 9),
	CONSTRAINT "recipe_versions_feed" CHECK (feed_mm_min between 50 and 15000),
	CONSTRAINT "recipe_versions_cut_height" CHECK (cut_height_mm between 0.3 and 10),
	CONSTRAINT "recipe_versions_pierce_height" CHECK (pierce_height_mm between 0.5 and 20 and pierce_height_mm >= cut_height_mm),
	CONSTRAINT "recipe_versions_pierce_delay" CHECK (pierce_delay_s between 0 and 10),
	CONSTRAINT "recipe_versions_arc_voltage" CHECK (arc_voltage_v between 50 and 220),
	CONSTRAINT "recipe_versions_kerf" CHECK (kerf_width_mm between 0.3 and 6)
);
--> statement-breakpoint
ALTER TABLE "recipe_versions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "recipes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"shop_id" uuid NOT NULL,
	"state" "recipe_state" DEFAULT 'draft' NOT NULL,
	"current_version" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "recipes_id_shop" UNIQUE("id","shop_id")
);
--> statement-breakpoint
ALTER TABLE "recipes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "idempotency_keys" (
	"user_id" uuid NOT NULL,
	"key" text NOT NULL,
	"request_digest" text NOT NULL,
	"status" smallint,
	"response" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_keys_user_id_key_pk" PRIMARY KEY("user_id","key")
);
--> statement-breakpoint
ALTER TABLE "idempotency_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"caller" text PRIMARY KEY NOT NULL,
	"hits" integer NOT NULL,
	"reset_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"sid" varchar PRIMARY KEY NOT NULL,
	"sess" json NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
CREATE TABLE "shares" (
	"recipe_id" uuid PRIMARY KEY NOT NULL,
	"shop_id" uuid NOT NULL,
	"level" "share_level" NOT NULL,
	"public_text" text DEFAULT '' NOT NULL,
	"shared_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "shares" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "shops" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"place" text NOT NULL,
	"state" "shop_state" DEFAULT 'active' NOT NULL,
	"state_reason" text DEFAULT '' NOT NULL,
	"joined_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "shops" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "test_cuts" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"shop_id" uuid NOT NULL,
	"recipe_id" uuid NOT NULL,
	"version_number" integer NOT NULL,
	"cut_at" timestamp with time zone NOT NULL,
	"cut_through" boolean NOT NULL,
	"dross" "dross" NOT NULL,
	"top_edge" "top_edge" NOT NULL,
	"bevel_deg" double precision,
	"kerf_width_mm" double precision,
	"u_mm" double precision,
	"rz5_um" double precision,
	"acceptable" boolean NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"recorded_by" uuid,
	"recorded_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "test_cuts_bevel" CHECK (bevel_deg between -45 and 45),
	CONSTRAINT "test_cuts_kerf" CHECK (kerf_width_mm between 0.3 and 6),
	CONSTRAINT "test_cuts_u" CHECK (u_mm between 0 and 20),
	CONSTRAINT "test_cuts_rz5" CHECK (rz5_um between 0 and 2000),
	CONSTRAINT "test_cuts_acceptable" CHECK (cut_through or not acceptable)
);
--> statement-breakpoint
ALTER TABLE "test_cuts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "network_admins" (
	"user_id" uuid PRIMARY KEY NOT NULL
);
--> statement-breakpoint
ALTER TABLE "network_admins" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"provider" text,
	"subject" text,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"units" "unit_system" DEFAULT 'metric' NOT NULL,
	"theme" "theme" DEFAULT 'system' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_identity" UNIQUE("provider","subject"),
	CONSTRAINT "users_email" UNIQUE("email")
);
--> statement-breakpoint
ALTER TABLE "users" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "applications" ADD CONSTRAINT "applications_decided_by_users_id_fk" FOREIGN KEY ("decided_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "applications" ADD CONSTRAINT "applications_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "audit_log" ADD CONSTRAINT "audit_log_actor_id_users_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contributing_machines" ADD CONSTRAINT "contributing_machines_machine_id_machines_id_fk" FOREIGN KEY ("machine_id") REFERENCES "public"."machines"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contributors" ADD CONSTRAINT "contributors_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edition_builds" ADD CONSTRAINT "edition_builds_edition_id_editions_id_fk" FOREIGN KEY ("edition_id") REFERENCES "public"."editions"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edition_builds" ADD CONSTRAINT "edition_builds_requested_by_users_id_fk" FOREIGN KEY ("requested_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edition_groups" ADD CONSTRAINT "edition_groups_edition_id_editions_id_fk" FOREIGN KEY ("edition_id") REFERENCES "public"."editions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edition_ledger" ADD CONSTRAINT "edition_ledger_edition_id_editions_id_fk" FOREIGN KEY ("edition_id") REFERENCES "public"."editions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "listed_recipes" ADD CONSTRAINT "listed_recipes_edition_id_editions_id_fk" FOREIGN KEY ("edition_id") REFERENCES "public"."editions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "editions" ADD CONSTRAINT "editions_published_by_users_id_fk" FOREIGN KEY ("published_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machines" ADD CONSTRAINT "machines_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe_versions" ADD CONSTRAINT "recipe_versions_changed_by_users_id_fk" FOREIGN KEY ("changed_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe_versions" ADD CONSTRAINT "recipe_versions_recipe" FOREIGN KEY ("recipe_id","shop_id") REFERENCES "public"."recipes"("id","shop_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe_versions" ADD CONSTRAINT "recipe_versions_machine" FOREIGN KEY ("machine_id","shop_id") REFERENCES "public"."machines"("id","shop_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipes" ADD CONSTRAINT "recipes_shop_id_shops_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shops"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "shares" ADD CONSTRAINT "shares_recipe" FOREIGN KEY ("recipe_id","shop_id") REFERENCES "public"."recipes"("id","shop_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_cuts" ADD CONSTRAINT "test_cuts_recorded_by_users_id_fk" FOREIGN KEY ("recorded_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_cuts" ADD CONSTRAINT "test_cuts_version" FOREIGN KEY ("recipe_id","version_number") REFERENCES "public"."recipe_versions"("recipe_id","number") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "network_admins" ADD CONSTRAINT "network_admins_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "audit_log_at" ON "audit_log" USING btree ("at");--> statement-breakpoint
CREATE INDEX "edition_groups_material" ON "edition_groups" USING btree ("edition_id","material","process_gas");--> statement-breakpoint
CREATE INDEX "listed_recipes_group" ON "listed_recipes" USING btree ("edition_id","group_id");--> statement-breakpoint
CREATE INDEX "invitations_email" ON "invitations" USING btree ("email");--> statement-breakpoint
CREATE INDEX "memberships_shop" ON "memberships" USING btree ("shop_id");--> statement-breakpoint
CREATE INDEX "recipe_versions_shop" ON "recipe_versions" USING btree ("shop_id","material","thickness_mm");--> statement-breakpoint
CREATE INDEX "recipe_versions_machine_id" ON "recipe_versions" USING btree ("machine_id");--> statement-breakpoint
CREATE INDEX "recipes_shop_changed" ON "recipes" USING btree ("shop_id","changed_at");--> statement-breakpoint
CREATE INDEX "idempotency_keys_created" ON "idempotency_keys" USING btree ("created_at");--> statement-breakpoint
CREATE INDEX "rate_limits_reset" ON "rate_limits" USING btree ("reset_at");--> statement-breakpoint
CREATE INDEX "sessions_expire" ON "sessions" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "shares_shop" ON "shares" USING btree ("shop_id");--> statement-breakpoint
CREATE INDEX "test_cuts_recipe" ON "test_cuts" USING btree ("recipe_id","cut_at");--> statement-breakpoint
CREATE INDEX "test_cuts_shop" ON "test_cuts" USING btree ("shop_id","cut_at");--> statement-breakpoint
CREATE POLICY "applications_anyone_applies" ON "applications" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK (state = 'waiting' and shop_id is null);--> statement-breakpoint
CREATE POLICY "applications_own" ON "applications" AS PERMISSIVE FOR SELECT TO "web" USING (email = (select nullif(current_setting('app.email', true), '')));--> statement-breakpoint
CREATE POLICY "applications_admin_select" ON "applications" AS PERMISSIVE FOR SELECT TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "applications_admin_update" ON "applications" AS PERMISSIVE FOR UPDATE TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "audit_log_append" ON "audit_log" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "audit_log_admin_select" ON "audit_log" AS PERMISSIVE FOR SELECT TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "edition_builds_admin_select" ON "edition_builds" AS PERMISSIVE FOR SELECT TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "edition_builds_admin_insert" ON "edition_builds" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "edition_builds_builder" ON "edition_builds" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "edition_groups_published" ON "edition_groups" AS PERMISSIVE FOR SELECT TO "web" USING (exists (select 1 from editions e where e.id = edition_id and e.state = 'published') or (select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "edition_groups_builder" ON "edition_groups" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "edition_ledger_builder" ON "edition_ledger" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "listed_recipes_published" ON "listed_recipes" AS PERMISSIVE FOR SELECT TO "web" USING (exists (select 1 from editions e where e.id = edition_id and e.state = 'published') or (select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "listed_recipes_builder" ON "listed_recipes" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "editions_published" ON "editions" AS PERMISSIVE FOR SELECT TO "web" USING (state = 'published');--> statement-breakpoint
CREATE POLICY "editions_admin_select" ON "editions" AS PERMISSIVE FOR SELECT TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "editions_admin_update" ON "editions" AS PERMISSIVE FOR UPDATE TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "editions_builder" ON "editions" AS PERMISSIVE FOR ALL TO "edition_builder" USING (true) WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "invitations_to_me" ON "invitations" AS PERMISSIVE FOR SELECT TO "web" USING (email = (select nullif(current_setting('app.email', true), '')));--> statement-breakpoint
CREATE POLICY "invitations_accept" ON "invitations" AS PERMISSIVE FOR UPDATE TO "web" USING (email = (select nullif(current_setting('app.email', true), ''))) WITH CHECK (email = (select nullif(current_setting('app.email', true), '')));--> statement-breakpoint
CREATE POLICY "invitations_admin_insert" ON "invitations" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "machines_own_shop" ON "machines" AS PERMISSIVE FOR ALL TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)) WITH CHECK (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "memberships_own" ON "memberships" AS PERMISSIVE FOR SELECT TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid) or user_id = (select nullif(current_setting('app.user_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "memberships_by_invitation" ON "memberships" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK (user_id = (select nullif(current_setting('app.user_id', true), '')::uuid) and exists (select 1 from invitations i where i.shop_id = memberships.shop_id and i.role = memberships.role and i.accepted_at is null));--> statement-breakpoint
CREATE POLICY "recipe_versions_own_shop" ON "recipe_versions" AS PERMISSIVE FOR ALL TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)) WITH CHECK (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "recipes_own_shop" ON "recipes" AS PERMISSIVE FOR ALL TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)) WITH CHECK (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "idempotency_keys_own" ON "idempotency_keys" AS PERMISSIVE FOR ALL TO "web" USING (user_id = (select nullif(current_setting('app.user_id', true), '')::uuid)) WITH CHECK (user_id = (select nullif(current_setting('app.user_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "shares_own_shop" ON "shares" AS PERMISSIVE FOR ALL TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)) WITH CHECK (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "shops_own" ON "shops" AS PERMISSIVE FOR SELECT TO "web" USING (id = (select nullif(current_setting('app.shop_id', true), '')::uuid) or id in (select m.shop_id from memberships m where m.user_id = (select nullif(current_setting('app.user_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "shops_admin_select" ON "shops" AS PERMISSIVE FOR SELECT TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "shops_admin_insert" ON "shops" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "shops_admin_update" ON "shops" AS PERMISSIVE FOR UPDATE TO "web" USING ((select current_setting('app.admin', true) = 'yes'));--> statement-breakpoint
CREATE POLICY "test_cuts_own_shop" ON "test_cuts" AS PERMISSIVE FOR ALL TO "web" USING (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)) WITH CHECK (shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "network_admins_self" ON "network_admins" AS PERMISSIVE FOR SELECT TO "web" USING (user_id = (select nullif(current_setting('app.user_id', true), '')::uuid));--> statement-breakpoint
CREATE POLICY "users_own_shop" ON "users" AS PERMISSIVE FOR SELECT TO "web" USING (id = (select nullif(current_setting('app.user_id', true), '')::uuid) or id in (select m.user_id from memberships m where m.shop_id = (select nullif(current_setting('app.shop_id', true), '')::uuid)));--> statement-breakpoint
CREATE POLICY "users_signing_in" ON "users" AS PERMISSIVE FOR SELECT TO "web" USING (provider || '|' || subject = (select nullif(current_setting('app.identity', true), '')) or email = (select nullif(current_setting('app.email', true), '')));--> statement-breakpoint
CREATE POLICY "users_first_sign_in" ON "users" AS PERMISSIVE FOR INSERT TO "web" WITH CHECK (email = (select nullif(current_setting('app.email', true), '')));--> statement-breakpoint
CREATE POLICY "users_self" ON "users" AS PERMISSIVE FOR UPDATE TO "web" USING (id = (select nullif(current_setting('app.user_id', true), '')::uuid) or email = (select nullif(current_setting('app.email', true), ''))) WITH CHECK (id = (select nullif(current_setting('app.user_id', true), '')::uuid) or email = (select nullif(current_setting('app.email', true), '')));