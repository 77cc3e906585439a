-- What the generated schema cannot say: who may do what, what may never change, and what the edition builder reads.

GRANT USAGE ON SCHEMA public TO web, edition_builder;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON machines, recipes, shares, idempotency_keys, sessions, rate_limits TO web;--> statement-breakpoint
GRANT SELECT, INSERT ON recipe_versions, test_cuts, memberships TO web;--> statement-breakpoint
GRANT UPDATE (proven_at) ON recipe_versions TO web;--> statement-breakpoint
GRANT SELECT ON shops, network_admins, edition_groups, listed_recipes TO web;--> statement-breakpoint
GRANT INSERT, UPDATE (state, state_reason) ON shops TO web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (provider, subject, name, units, theme) ON users TO web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (accepted_at) ON invitations TO web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE (state, reason, decided_at, decided_by, shop_id) ON applications TO web;--> statement-breakpoint
GRANT SELECT, UPDATE (state, published_at, published_by) ON editions TO web;--> statement-breakpoint
GRANT SELECT, INSERT ON edition_builds, audit_log TO web;--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON editions, edition_groups, listed_recipes, edition_ledger, edition_builds TO edition_builder;--> statement-breakpoint

-- Every shop and machine gets its opaque number when it is made; 2^52 keeps it exact in JavaScript.
CREATE FUNCTION opaque_number() RETURNS bigint LANGUAGE sql VOLATILE AS $$
  SELECT ('x' || translate(substr(gen_random_uuid()::text, 1, 8) || substr(gen_random_uuid()::text, 1, 5), '-', ''))::bit(52)::bigint
$$;--> statement-breakpoint
CREATE FUNCTION number_contributor() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
BEGIN
  IF TG_TABLE_NAME = 'shops' THEN
    INSERT INTO contributors (shop_id, number) VALUES (NEW.id, opaque_number());
  ELSE
    INSERT INTO contributing_machines (machine_id, number) VALUES (NEW.id, opaque_number());
  END IF;
  RETURN NULL;
END $$;--> statement-breakpoint
CREATE TRIGGER shops_number AFTER INSERT ON shops FOR EACH ROW EXECUTE FUNCTION number_contributor();--> statement-breakpoint
CREATE TRIGGER machines_number AFTER INSERT ON machines FOR EACH ROW EXECUTE FUNCTION number_contributor();--> statement-breakpoint

-- What counts: shared, proven as it stands now, from an active shop; setpoints and opaque numbers, no name, note or person.
-- Runs with its owner's rights, so the builder needs none on the tables below it.
CREATE VIEW counted_contributions AS
  SELECT DISTINCT ON (v.machine_id, v.material, round(10 * log(v.thickness_mm::numeric)), round(v.nozzle_mm::numeric, 1), v.process_gas)
    c.number AS shop,
    cm.number AS machine,
    v.material,
    v.process_gas AS gas,
    round(10 * log(v.thickness_mm::numeric))::integer AS band_index,
    round(v.nozzle_mm::numeric, 1)::double precision AS nozzle_mm,
    v.thickness_mm,
    v.current_a,
    v.pressure_bar,
    v.feed_mm_min,
    v.cut_height_mm,
    v.pierce_height_mm,
    v.pierce_delay_s,
    v.arc_voltage_v,
    v.kerf_width_mm,
    s.level AS share_level,
    s.public_text,
    v.proven_at,
    m.start_method,
    m.dryness,
    m.height_control,
    (SELECT count(*) FROM test_cuts t WHERE t.recipe_id = v.recipe_id AND t.version_number = v.number)::integer AS test_cuts,
    (SELECT count(*) FROM test_cuts t WHERE t.recipe_id = v.recipe_id AND t.version_number = v.number AND t.acceptable)::integer AS accepted_cuts
  FROM shares s
  JOIN recipes r ON r.id = s.recipe_id AND r.state = 'proven'
  JOIN recipe_versions v ON v.recipe_id = r.id AND v.number = r.current_version AND v.proven_at IS NOT NULL
  JOIN machines m ON m.id = v.machine_id
  JOIN shops h ON h.id = r.shop_id AND h.state = 'active'
  JOIN contributors c ON c.shop_id = r.shop_id
  JOIN contributing_machines cm ON cm.machine_id = v.machine_id
  ORDER BY v.machine_id, v.material, round(10 * log(v.thickness_mm::numeric)), round(v.nozzle_mm::numeric, 1), v.process_gas, v.proven_at DESC, r.id;--> statement-breakpoint
GRANT SELECT ON counted_contributions TO edition_builder;--> statement-breakpoint

-- How much each member shares, for admins: counts only, so that no policy need open the tables themselves to them.
CREATE FUNCTION member_overview() RETURNS TABLE (
  id uuid, name text, place text, state shop_state, state_reason text, joined_at timestamptz, people integer, machines integer, shared_recipes integer
) LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT s.id, s.name, s.place, s.state, s.state_reason, s.joined_at,
    (SELECT count(*) FROM memberships m WHERE m.shop_id = s.id)::integer,
    (SELECT count(*) FROM machines m WHERE m.shop_id = s.id)::integer,
    (SELECT count(*) FROM shares h WHERE h.shop_id = s.id)::integer
  FROM shops s
  WHERE current_setting('app.admin', true) = 'yes'
$$;--> statement-breakpoint
REVOKE ALL ON FUNCTION member_overview() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION member_overview() TO web;--> statement-breakpoint

-- Sessions of a shop's people end with it.
CREATE FUNCTION end_shop_sessions(ended uuid) RETURNS integer LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  WITH gone AS (
    DELETE FROM sessions
    WHERE current_setting('app.admin', true) = 'yes'
      AND sess #>> '{passport,user}' IN (SELECT m.user_id::text FROM memberships m WHERE m.shop_id = ended)
    RETURNING 1
  ) SELECT count(*)::integer FROM gone
$$;--> statement-breakpoint
REVOKE ALL ON FUNCTION end_shop_sessions(uuid) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION end_shop_sessions(uuid) TO web;--> statement-breakpoint

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only', TG_TABLE_NAME USING ERRCODE = 'restrict_violation';
END $$;--> statement-breakpoint
-- The one update let through is a foreign key emptying actor_id when a person is gone.
CREATE TRIGGER audit_log_append_only BEFORE UPDATE ON audit_log FOR EACH ROW
  WHEN (NEW.actor_id IS NOT NULL OR (OLD.at, OLD.action, OLD.detail) IS DISTINCT FROM (NEW.at, NEW.action, NEW.detail))
  EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER audit_log_no_delete BEFORE DELETE ON audit_log FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint

CREATE FUNCTION keep_published_edition() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  edition uuid := CASE TG_TABLE_NAME WHEN 'editions' THEN (to_jsonb(OLD) ->> 'id')::uuid
                  ELSE (CASE TG_OP WHEN 'INSERT' THEN to_jsonb(NEW) ELSE to_jsonb(OLD) END ->> 'edition_id')::uuid END;
BEGIN
  IF EXISTS (SELECT 1 FROM editions e WHERE e.id = edition AND e.state = 'published')
     -- A person leaving empties published_by; nothing else may change.
     AND NOT (TG_TABLE_NAME = 'editions' AND TG_OP = 'UPDATE'
              AND to_jsonb(OLD) - 'published_by' = to_jsonb(NEW) - 'published_by') THEN
    RAISE EXCEPTION 'a published edition never changes' USING ERRCODE = 'restrict_violation';
  END IF;
  RETURN CASE TG_OP WHEN 'DELETE' THEN OLD ELSE NEW END;
END $$;--> statement-breakpoint
CREATE TRIGGER editions_published BEFORE UPDATE OR DELETE ON editions FOR EACH ROW EXECUTE FUNCTION keep_published_edition();--> statement-breakpoint
CREATE TRIGGER edition_groups_published BEFORE INSERT OR UPDATE OR DELETE ON edition_groups FOR EACH ROW EXECUTE FUNCTION keep_published_edition();--> statement-breakpoint
CREATE TRIGGER listed_recipes_published BEFORE INSERT OR UPDATE OR DELETE ON listed_recipes FOR EACH ROW EXECUTE FUNCTION keep_published_edition();
