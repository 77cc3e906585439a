import type { Access } from "#shared/contracts/endpoint.ts";
import { ProblemError } from "./problem.ts";

/** Who makes a request, as the product's own tables know them. */
export interface Actor {
  userId: string | null;
  name: string;
  email: string;
  units: "metric" | "inch";
  theme: "system" | "light" | "dark";
  admin: boolean;
  shopId: string | null;
  shopName: string;
  shopState: "active" | "suspended" | null;
  role: "owner" | "operator" | null;
}

export interface UserActor extends Actor {
  userId: string;
}

export interface ShopActor extends UserActor {
  shopId: string;
  role: "owner" | "operator";
}

/** What a handler may rely on, given who its endpoint lets in. */
export type ActorFor<Who extends Access> = Who extends "operator" | "owner"
  ? ShopActor
  : Who extends "anyone"
    ? Actor
    : UserActor;

export const visitor: Actor = {
  userId: null,
  name: "",
  email: "",
  units: "metric",
  theme: "system",
  admin: false,
  shopId: null,
  shopName: "",
  shopState: null,
  role: null,
};

/** Refuses whoever the endpoint is not for. An admin acts for no shop, so a shop's work is refused them too. */
export function requireAccess(actor: Actor, access: Access): void {
  if (access === "anyone") return;
  if (actor.userId === null) throw new ProblemError("not-signed-in");
  if (access === "signed-in") return;
  if (access === "admin") {
    if (!actor.admin) throw new ProblemError("not-allowed");
    return;
  }
  if (access === "member" && actor.admin) return;
  if (actor.shopId === null) throw new ProblemError("not-allowed");
  if (actor.shopState !== "active") throw new ProblemError("shop-suspended");
  if (access === "owner" && actor.role !== "owner") throw new ProblemError("not-allowed");
}
