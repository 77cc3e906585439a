import type { DemoAccount } from "./accounts.ts";

const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);

export const styleSheet = `
:root { color-scheme: light dark; --ground: #f5f6f4; --raised: #ffffff; --line: #b8beb6; --quiet: #414843; --ink: #1b211e; --act: #12474c; }
@media (prefers-color-scheme: dark) {
  :root { --ground: #1b211e; --raised: #2a312d; --line: #747c75; --quiet: #d5d9d3; --ink: #f5f6f4; --act: #dcebea; }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--ground); color: var(--ink); font: 15px/20px Lato, system-ui, sans-serif; }
main { max-width: 480px; margin: 0 auto; padding: 32px 16px; }
h1 { font-size: 22px; line-height: 28px; margin: 0 0 8px; }
p { margin: 0 0 16px; color: var(--quiet); }
.notice { border: 1px solid var(--line); border-left-width: 4px; padding: 8px 12px; border-radius: 2px; }
button { display: block; width: 100%; min-height: 44px; margin: 0 0 8px; padding: 8px 12px; text-align: left; font: inherit;
  color: var(--ink); background: var(--raised); border: 1px solid var(--line); border-radius: 2px; cursor: pointer; }
button:hover { border-color: var(--act); }
button:focus-visible { outline: 2px solid var(--act); outline-offset: 2px; }
button strong { display: block; }
button span { color: var(--quiet); font-size: 13px; line-height: 16px; }
button.plain { width: auto; margin-top: 16px; }
`;

/** Anything in `body` is already HTML; the title is text. */
function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(title)}</title>
<link rel="stylesheet" href="/stand-in.css">
</head>
<body><main><h1>${escapeHtml(title)}</h1>
${body}
</main></body>
</html>
`;
}

const notice = `<p class="notice">This page stands in for a real sign-in provider so that the demonstration runs on one
machine. It asks for no password and its people are invented. Never use it where real data is kept.</p>`;

function accountButton({ sub, name, role, shop, email }: DemoAccount): string {
  const detail = [role, shop, email].filter((part) => part !== null).map(escapeHtml);
  return `<button name="sub" value="${escapeHtml(sub)}"><strong>${escapeHtml(name)}</strong> <span>${detail.join(" · ")}</span></button>`;
}

export function chooserPage(accounts: readonly DemoAccount[]): string {
  return page(
    "Demo sign-in",
    `${notice}<p>Sign in as:</p><form method="post">${accounts.map(accountButton).join("\n")}
<button class="plain" name="sub" value="">Cancel</button></form>`,
  );
}

/** @param form  the provider's own form, with the id its button needs */
export function signOutPage(form: string): string {
  return page(
    "Sign out?",
    `${notice}${form}<button form="op.logoutForm" name="logout" value="yes">Sign out here too</button>
<button form="op.logoutForm" class="plain">Stay signed in here</button>`,
  );
}

export function signedOutPage(): string {
  return page("Signed out", notice);
}

export function problemPage(title: string, detail: string): string {
  return page(title, `${notice}<p>${escapeHtml(detail)}</p>`);
}
