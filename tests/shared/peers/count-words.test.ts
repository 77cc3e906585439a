import { expect, test } from "vitest";
import { countWords } from "#shared/peers/count-words.ts";

test("says a band as people do", () => {
  expect(countWords("20-49")).toBe("20 to 49 shops");
  expect(countWords("50+", "recipes")).toBe("50 or more recipes");
});
