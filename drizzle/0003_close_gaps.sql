ALTER TABLE "rate_limits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "test_cuts" DROP CONSTRAINT "test_cuts_version";
--> statement-breakpoint
ALTER TABLE "recipe_versions" ADD CONSTRAINT "recipe_versions_of_shop" UNIQUE("recipe_id","number","shop_id");--> statement-breakpoint
ALTER TABLE "test_cuts" ADD CONSTRAINT "test_cuts_version" FOREIGN KEY ("recipe_id","version_number","shop_id") REFERENCES "public"."recipe_versions"("recipe_id","number","shop_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "applications_waiting_email" ON "applications" USING btree ("email") WHERE state = 'waiting';--> statement-breakpoint
ALTER TABLE "applications" ADD CONSTRAINT "applications_email_lower" CHECK (email = lower(email));--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_email_lower" CHECK (email = lower(email));--> statement-breakpoint
ALTER TABLE "users" ADD CONSTRAINT "users_email_lower" CHECK (email = lower(email));--> statement-breakpoint
CREATE POLICY "rate_limits_counting" ON "rate_limits" AS PERMISSIVE FOR ALL TO "web" USING ((select coalesce(current_setting('app.acting', true), '') <> 'yes')) WITH CHECK ((select coalesce(current_setting('app.acting', true), '') <> 'yes'));--> statement-breakpoint
CREATE POLICY "sessions_store" ON "sessions" AS PERMISSIVE FOR ALL TO "web" USING ((select coalesce(current_setting('app.acting', true), '') <> 'yes')) WITH CHECK ((select coalesce(current_setting('app.acting', true), '') <> 'yes'));--> statement-breakpoint
ALTER POLICY "applications_anyone_applies" ON "applications" TO web WITH CHECK (state = 'waiting' and reason = '' and decided_at is null and decided_by is null and shop_id is null);--> statement-breakpoint
ALTER POLICY "audit_log_append" ON "audit_log" TO web WITH CHECK (actor_id is not distinct from (select nullif(current_setting('app.user_id', true), '')::uuid) and at = now());--> statement-breakpoint
ALTER POLICY "invitations_accept" ON "invitations" TO web USING (email = (select nullif(current_setting('app.email', true), '')) and accepted_at is null) WITH CHECK (email = (select nullif(current_setting('app.email', true), '')) and accepted_at is not null);--> statement-breakpoint
ALTER POLICY "memberships_by_invitation" ON "memberships" TO web WITH CHECK (user_id = (select nullif(current_setting('app.user_id', true), '')::uuid) and exists (select 1 from invitations i where i.email = (select nullif(current_setting('app.email', true), '')) and i.shop_id = memberships.shop_id and i.role = memberships.role and i.accepted_at is null));--> statement-breakpoint
ALTER POLICY "users_first_sign_in" ON "users" TO web WITH CHECK (email = (select nullif(current_setting('app.email', true), '')) and provider || '|' || subject = (select nullif(current_setting('app.identity', true), '')));--> statement-breakpoint
ALTER POLICY "users_self" ON "users" TO web USING (id = (select nullif(current_setting('app.user_id', true), '')::uuid) or (email = (select nullif(current_setting('app.email', true), '')) and subject is null)) WITH CHECK (id = (select nullif(current_setting('app.user_id', true), '')::uuid) or (email = (select nullif(current_setting('app.email', true), '')) and provider || '|' || subject = (select nullif(current_setting('app.identity', true), ''))));--> statement-breakpoint

-- What the generated part cannot say. An account stays with the identity that first signed in to it.
CREATE TRIGGER users_identity_bound_once BEFORE UPDATE OF provider, subject ON users FOR EACH ROW
  WHEN (current_user = 'web' AND OLD.subject IS NOT NULL AND (OLD.provider, OLD.subject) IS DISTINCT FROM (NEW.provider, NEW.subject))
  EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- The subject of an entry does not change either.
DROP TRIGGER audit_log_append_only ON audit_log;--> statement-breakpoint
CREATE TRIGGER audit_log_append_only BEFORE UPDATE ON audit_log FOR EACH ROW
  WHEN (NEW.actor_id IS NOT NULL OR (OLD.id, OLD.at, OLD.action, OLD.subject_id, OLD.detail) IS DISTINCT FROM (NEW.id, NEW.at, NEW.action, NEW.subject_id, NEW.detail))
  EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- Whether an address may be admitted, for admins: the word alone, so that no policy need open people to them.
CREATE FUNCTION email_standing(asked text) RETURNS text
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT CASE
    WHEN EXISTS (SELECT 1 FROM users u JOIN memberships m ON m.user_id = u.id WHERE u.email = asked) THEN 'member'
    WHEN EXISTS (SELECT 1 FROM invitations i WHERE i.email = asked AND i.accepted_at IS NULL) THEN 'invited'
    ELSE 'free'
  END
  WHERE current_setting('app.admin', true) = 'yes'
$$;--> statement-breakpoint
REVOKE ALL ON FUNCTION email_standing(text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION email_standing(text) TO web;
