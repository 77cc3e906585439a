import type { z } from "zod";
import type { Db } from "#server/db/client.ts";
import { appendAudit } from "#server/features/audit/audit.service.ts";
import { requireMachine } from "#server/features/machines/machines.service.ts";
import { getRecipe, lockRecipe } from "#server/features/recipes/recipes.service.ts";
import type { ShopActor } from "#server/http/actor.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { Recipe } from "#shared/contracts/recipes.ts";
import { sharingLevels } from "#shared/contracts/recipes.ts";
import type { Sharing, SharingInput, SharingPreview } from "#shared/contracts/sharing.ts";
import { type OwnNames, screenText, textRefusalWords } from "#shared/disclosure/text-screening.ts";
import { peerGroupId, peerGroupOf } from "#shared/peers/peer-group.ts";
import { type PreviewSubject, previewSharing, subjectOf } from "./preview.ts";
import * as queries from "./sharing.queries.ts";
import { ownNames } from "./telling-texts.service.ts";

type Input = z.output<typeof SharingInput>;

export async function getSharing(tx: Db, actor: ShopActor, id: string): Promise<Sharing> {
  const recipe = await getRecipe(tx, actor, id);
  const share = await queries.findShare(tx, actor.shopId, id);
  const subject = await subjectFor(tx, actor, recipe);
  const publicText = share?.publicText ?? "";
  return {
    level: share?.level ?? "private",
    publicText,
    notCountedBecause: share ? await whyNotCounted(tx, actor, recipe) : null,
    previews: sharingLevels.map((level) => previewSharing(subject, level, publicText)),
  };
}

export async function tryOut(
  tx: Db,
  actor: ShopActor,
  id: string,
  { level, publicText }: Input,
): Promise<{ preview: SharingPreview; textRefused: string[] }> {
  const subject = await subjectFor(tx, actor, await getRecipe(tx, actor, id));
  const textRefused = refusalsOf(publicText, subject.own);
  return { preview: previewSharing(subject, level, publicText), textRefused };
}

/** Withdrawing is always allowed; sharing needs a recipe that is proven as it stands. Takes effect with the next edition. */
export async function changeSharing(tx: Db, actor: ShopActor, id: string, input: Input): Promise<Sharing> {
  const { state, currentVersion } = await lockRecipe(tx, actor, id);
  const before = (await queries.findShare(tx, actor.shopId, id))?.level ?? "private";
  if (input.level === "private") await queries.deleteShare(tx, actor.shopId, id);
  else {
    if (state === "retired") throw new ProblemError("wrong-state", { detail: "A retired recipe cannot be shared" });
    const provenAt = await queries.findProvenAt(tx, actor.shopId, id, currentVersion);
    if (state !== "proven" || provenAt === null) throw new ProblemError("not-proven");
    await refuseTellingText(tx, actor, input.publicText);
    // Words are for listed recipes: kept beside a counted one they would only wait to be shown by mistake.
    const publicText = input.level === "listed" ? input.publicText : "";
    await queries.saveShare(tx, { recipeId: id, shopId: actor.shopId, level: input.level, publicText });
  }
  if (before !== input.level) await appendAudit(tx, actor, "sharing-changed", null, { from: before, to: input.level });
  return getSharing(tx, actor, id);
}

async function refuseTellingText(tx: Db, actor: ShopActor, text: string): Promise<void> {
  const refusals = refusalsOf(text, await ownNames(tx, actor.shopId));
  if (refusals.length === 0) return;
  throw new ProblemError("invalid-request", {
    errors: refusals.map((detail) => ({ pointer: "/publicText", detail })),
  });
}

function refusalsOf(text: string, own: OwnNames): string[] {
  return screenText(text, own).map((reason) => textRefusalWords[reason]);
}

async function subjectFor(tx: Db, actor: ShopActor, recipe: Recipe): Promise<PreviewSubject> {
  const { number, content } = recipe.version;
  const provenAt = await queries.findProvenAt(tx, actor.shopId, recipe.id, number);
  return {
    recipe,
    machine: await requireMachine(tx, actor, content.machineId),
    own: await ownNames(tx, actor.shopId),
    provenAt: provenAt?.toISOString() ?? null,
    units: actor.units,
  };
}

async function whyNotCounted(tx: Db, actor: ShopActor, recipe: Recipe): Promise<Sharing["notCountedBecause"]> {
  if (recipe.state === "retired") return "retired";
  if (recipe.state !== "proven" || !recipe.version.proven) return "not-proven";
  if (actor.shopState !== "active") return "shop-suspended";
  const groupId = peerGroupId(peerGroupOf(subjectOf(recipe.version.content)));
  const countable = await queries.listCountable(tx, actor.shopId, recipe.version.content.machineId);
  const counts = countable.find((other) => peerGroupId(peerGroupOf(other)) === groupId);
  return counts?.recipeId === recipe.id ? null : "newer-recipe-counts";
}
