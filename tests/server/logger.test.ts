import { Writable } from "node:stream";
import { DrizzleQueryError } from "drizzle-orm/errors";
import { expect, test } from "vitest";
import { openLogger } from "#server/logger.ts";

test("a statement that failed leaves its code in the log, and neither its text nor its values", () => {
  let written = "";
  const stream = new Writable({
    write: (chunk, _encoding, done) => {
      written += chunk;
      done();
    },
  });
  const cause = Object.assign(new Error("duplicate key value violates unique constraint"), {
    code: "23505",
    detail: "Key (public_text)=(told in confidence) already exists.",
  });
  const error = new DrizzleQueryError("insert into listed_recipes values ($1)", ["told in confidence"], cause);
  openLogger("info", stream).error({ err: error, seconds: 1 }, "not built");
  expect(JSON.parse(written)).toMatchObject({ msg: "not built", err: { code: "23505", message: cause.message } });
  expect(written).not.toMatch(/confidence|listed_recipes/);
});
