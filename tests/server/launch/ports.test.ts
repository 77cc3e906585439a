import { expect, test } from "vitest";
import { reservePort } from "#server/launch/ports.ts";

test("gives the preferred port while it is free, then another", async () => {
  const { port } = await reservePort(0).then(async (held) => {
    await held.release();
    return held;
  });
  const first = await reservePort(port);
  const second = await reservePort(port);
  expect(first.port).toBe(port);
  expect(second.port).not.toBe(port);
  await Promise.all([first.release(), second.release()]);
});
