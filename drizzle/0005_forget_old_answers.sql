-- Answers to POST requests are kept for two days: no client tries again after longer. Whose they are is no matter, so
-- this runs with its owner's rights, above row-level security.
CREATE FUNCTION forget_old_answers() RETURNS integer LANGUAGE sql VOLATILE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  WITH gone AS (DELETE FROM idempotency_keys WHERE created_at < now() - interval '2 days' RETURNING 1)
  SELECT count(*)::integer FROM gone
$$;--> statement-breakpoint
REVOKE ALL ON FUNCTION forget_old_answers() FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION forget_old_answers() TO web;
