import { afterAll, expect, test } from "vitest";
import { forgetOldAnswers } from "#server/http/idempotency.queries.ts";
import { countHit, forgetPassedWindows } from "#server/http/rate-limit.queries.ts";
import { openTestDatabase } from "../../support/database.ts";
import { makeUser } from "../../support/factories.ts";

const { owner, web, close } = await openTestDatabase();

afterAll(close);

test("answers older than two days are forgotten, younger ones kept, whoever they were for", async () => {
  const user = await makeUser(owner);
  await owner.pool.query(
    `insert into idempotency_keys (user_id, key, request_digest, created_at)
     values ($1, 'old-answer', 'x', now() - interval '3 days'), ($1, 'new-answer', 'x', now() - interval '1 day')`,
    [user.id],
  );
  await forgetOldAnswers(web.db);
  const { rows } = await owner.pool.query("select key from idempotency_keys");
  expect(rows).toEqual([{ key: "new-answer" }]);
});

test("request counts go once their window has passed", async () => {
  await countHit(web.db, "test:passed", 0);
  await countHit(web.db, "test:open", 60_000);
  await forgetPassedWindows(web.db);
  const { rows } = await owner.pool.query("select caller from rate_limits");
  expect(rows).toEqual([{ caller: "test:open" }]);
});
