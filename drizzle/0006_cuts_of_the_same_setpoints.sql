-- A version that changes nothing but the note keeps its proof; its cuts are those of every version with that proof. Counting
-- the newest version's alone made such a note look like a change of what the shop gives.
CREATE OR REPLACE VIEW counted_contributions AS
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
    cuts.made AS test_cuts,
    cuts.accepted AS accepted_cuts
  FROM shares s
  JOIN recipes r ON r.id = s.recipe_id AND r.state = 'proven'
  JOIN recipe_versions v ON v.recipe_id = r.id AND v.number = r.current_version AND v.proven_at IS NOT NULL
  JOIN machines m ON m.id = v.machine_id
  JOIN shops h ON h.id = r.shop_id AND h.state = 'active'
  JOIN contributors c ON c.shop_id = r.shop_id
  JOIN contributing_machines cm ON cm.machine_id = v.machine_id
  CROSS JOIN LATERAL (
    SELECT count(*)::integer AS made, (count(*) FILTER (WHERE t.acceptable))::integer AS accepted
    FROM recipe_versions w
    JOIN test_cuts t ON t.recipe_id = w.recipe_id AND t.version_number = w.number
    WHERE w.recipe_id = v.recipe_id AND w.proven_at = v.proven_at
  ) cuts
  ORDER BY v.machine_id, v.material, round(10 * log(v.thickness_mm::numeric)), round(v.nozzle_mm::numeric, 1), v.process_gas, v.proven_at DESC, r.id;
