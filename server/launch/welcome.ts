import { type DemoAccount, demoAccounts } from "../../oidc-fake/accounts.ts";

function accountLines(accounts: readonly DemoAccount[]): string[] {
  const width = (pick: (account: DemoAccount) => string) =>
    Math.max(...accounts.map((account) => pick(account).length));
  const [nameWidth, emailWidth] = [width(({ name }) => name), width(({ email }) => email)];
  return accounts.map(
    ({ name, email, role, shop }) =>
      `  ${name.padEnd(nameWidth)}  ${email.padEnd(emailWidth)}  ${role}${shop ? `, ${shop}` : ""}`,
  );
}

/** The last thing the start command prints: where to go, who may be there, how to end it. */
export function welcome(address: string, logFolder: string): string {
  return [
    "",
    `Tempermark runs at  ${address}`,
    "",
    'Demo accounts: press "Sign in" and choose one. No passwords, all invented.',
    ...accountLines(demoAccounts),
    "",
    `Logs are in ${logFolder}. Ctrl-C stops it; the data stays.`,
    "",
  ].join("\n");
}
