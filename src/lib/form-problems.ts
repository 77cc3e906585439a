import { ApiProblem } from "./api-problem.ts";

/** "/setpoints/feedMmMin" -> "setpoints.feedMmMin"; "~1" and "~0" as RFC 6901 has them. */
export function fieldOfPointer(pointer: string): string {
  return pointer
    .replace(/^[/?]/, "")
    .split("/")
    .map((part) => part.replaceAll("~1", "/").replaceAll("~0", "~"))
    .join(".");
}

/** Anything else that went wrong while sending is a fault of this page. */
export function asProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  console.error(error);
  return new ApiProblem("internal", { title: "Something failed on this page", status: 500 });
}
