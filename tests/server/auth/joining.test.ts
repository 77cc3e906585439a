import { afterAll, beforeAll, expect, test } from "vitest";
import { BrowserJar } from "#tests/support/browser-jar.ts";
import { makeMachine, makeRecipe, makeShop } from "#tests/support/factories.ts";
import { type Site, signInAs, startSite } from "#tests/support/sign-in-site.ts";

let site: Site;
beforeAll(async () => {
  site = await startSite();
});
afterAll(() => site.stop());

test("whoever joins is named in nothing the shop has written for others", async () => {
  const shop = await makeShop(site.owner);
  const machine = await makeMachine(site.owner, shop.id);
  const texts = { copper: "As Sparrowgate does it, slowly.", brass: "Clean edge." } as const;
  for (const [material, text] of Object.entries(texts)) {
    const values = { proven: true, share: "listed", material: material as keyof typeof texts } as const;
    const { recipe } = await makeRecipe(site.owner, shop.id, machine.id, values);
    await site.owner.pool.query("update shares set public_text = $2 where recipe_id = $1", [recipe.id, text]);
  }
  await site.owner.pool.query(
    "insert into invitations (shop_id, email, role) values ($1, 'operator@brackenhold.example', 'operator')",
    [shop.id],
  );
  await signInAs(site, new BrowserJar(), "demo-operator");
  const { rows } = await site.owner.pool.query("select public_text from shares where shop_id = $1 order by 1", [
    shop.id,
  ]);
  expect(rows.map((row) => row.public_text)).toEqual(["", "Clean edge."]);
});
