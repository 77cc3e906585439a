/** Somebody who can sign in at the stand-in provider. All are invented; nobody by these names is meant. */
export interface DemoAccount {
  /** Subject: what the provider calls the person for ever. */
  sub: string;
  name: string;
  email: string;
  /** One line for the chooser and the start message. */
  role: string;
  shop: string | null;
}

export const demoAccounts = [
  {
    sub: "demo-owner",
    name: "Orla Brackenhold (demo)",
    email: "owner@brackenhold.example",
    role: "Owner of an established shop",
    shop: "Brackenhold Plate",
  },
  {
    sub: "demo-operator",
    name: "Tam Sparrowgate (demo)",
    email: "operator@brackenhold.example",
    role: "Operator in the same shop",
    shop: "Brackenhold Plate",
  },
  {
    sub: "demo-new-owner",
    name: "Wil Fernlatch (demo)",
    email: "owner@fernlatch.example",
    role: "Owner of a shop that has just joined",
    shop: "Fernlatch Yard",
  },
  {
    sub: "demo-suspended-owner",
    name: "Ned Quillmoor (demo)",
    email: "owner@quillmoor.example",
    role: "Owner of a suspended shop",
    shop: "Quillmoor Cutting",
  },
  {
    sub: "demo-admin",
    name: "Ida Tallyworth (demo)",
    email: "ida@tempermark.example",
    role: "Network admin",
    shop: null,
  },
  {
    sub: "demo-second-admin",
    name: "Gus Ledgerby (demo)",
    email: "gus@tempermark.example",
    role: "Network admin, the second pair of eyes",
    shop: null,
  },
  {
    sub: "demo-applicant",
    name: "Mab Osterhollow (demo)",
    email: "owner@osterhollow.example",
    role: "Applicant whose application waits",
    shop: "Osterhollow Fabrication",
  },
  {
    sub: "demo-visitor",
    name: "Pip Wanderlea (demo)",
    email: "pip@wanderlea.example",
    role: "Visitor nobody knows yet",
    shop: null,
  },
] as const satisfies readonly DemoAccount[];
