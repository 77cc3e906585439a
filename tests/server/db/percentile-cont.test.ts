import fc from "fast-check";
import { afterAll, beforeAll, expect, test } from "vitest";
import { type Database, openDatabase } from "#server/db/client.ts";
import { quantileType7 } from "#shared/stats/quantile-type7.ts";
import { createTestDatabase, type TestDatabase } from "../../support/database.ts";

let testDatabase: TestDatabase;
let web: Database;

beforeAll(async () => {
  testDatabase = await createTestDatabase();
  web = openDatabase(testDatabase.webUrl, { max: 1 });
});
afterAll(async () => {
  await web.close();
  await testDatabase.drop();
});

// PostgreSQL manual, 9.21 Aggregate Functions, percentile_cont: interpolates between the values next to the fraction of
// the ordering, which is type 7 of Hyndman and Fan (1996), The American Statistician 50(4), 361-365.
test("agrees with the percentile_cont of the PostgreSQL that is running", async () => {
  const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
  const fraction = fc.double({ min: 0, max: 1, noNaN: true });
  await fc.assert(
    fc.asyncProperty(fc.array(value, { minLength: 1, maxLength: 60 }), fraction, async (sample, share) => {
      const { rows } = await web.pool.query<{ quantile: number }>(
        "select percentile_cont($2::float8) within group (order by x) as quantile from unnest($1::float8[]) x",
        [sample, share],
      );
      const scale = Math.max(1, ...sample.map(Math.abs));
      expect(Math.abs(quantileType7(sample, share) - rows[0]!.quantile)).toBeLessThanOrEqual(1e-12 * scale);
    }),
    { seed: 20_260_801, numRuns: 200 },
  );
});
