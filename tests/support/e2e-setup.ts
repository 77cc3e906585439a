import type { TestProject } from "vitest/node";
import { type ProductUnderTest, startWholeProduct } from "./e2e-product.ts";

declare module "vitest" {
  interface ProvidedContext {
    product: ProductUnderTest;
  }
}

/** One product for all end-to-end tests: they meet it as its users do, with what earlier tests left in it. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { address, folder, stop } = await startWholeProduct();
  project.provide("product", { address, folder });
  return stop;
}
