import type { Application } from "#shared/contracts/applications.ts";

/** An application as admins see it. */
export function sampleApplication(patch: Partial<Application> = {}): Application {
  return {
    id: "0b6f0d0e-0000-4000-8000-0000000000a1",
    shopName: "Osterhollow Fabrication",
    place: "Lower Osterhollow",
    contactName: "Mab Osterhollow",
    email: "owner@osterhollow.example",
    machines: 2,
    about: "Gates and brackets from 3 mm mild steel.",
    state: "waiting",
    reason: "",
    createdAt: "2026-11-03T09:00:00.000Z",
    decidedAt: null,
    ...patch,
  };
}
