import { signInHref } from "../../lib/sign-in-href.ts";
import { Notice } from "../../ui/notice.tsx";
import { linkClasses } from "../../ui/text-link.tsx";

interface Words {
  title: string;
  text: string;
  /** Whether trying once more is likely to help. */
  again: boolean;
}

const outcomes: Record<string, Words> = {
  unavailable: {
    title: "Signing in does not work just now",
    text: "The sign-in provider or the database does not answer. Nothing is lost. Wait a minute.",
    again: true,
  },
  cancelled: { title: "You are not signed in", text: "Signing in was stopped at the provider.", again: true },
  expired: {
    title: "You are not signed in",
    text: "The sign-in took too long, or was begun in another browser.",
    again: true,
  },
  failed: {
    title: "Signing in failed",
    text: "If it fails again, tell the network's admin at what time.",
    again: true,
  },
  unverified: {
    title: "Your e-mail address is not verified",
    text: "Membership hangs on the address, so the sign-in provider must have verified it. Do that there first.",
    again: true,
  },
  "address-in-use": {
    title: "This e-mail address belongs to another account",
    text: "Sign in with the account you used before. If you no longer have it, ask the network's admin.",
    again: false,
  },
};

/** What became of a sign-in that came to nothing, as the address says it. */
export function SignInNotice({ outcome }: { outcome: string | null }) {
  if (outcome === null) return null;
  // The address may be typed by hand: anything else is a failure too.
  const { title, text, again } = outcomes[outcome] ?? outcomes.failed!;
  return (
    <Notice kind={outcome === "cancelled" ? "info" : "watch"} live title={title} className="mb-8 max-w-text">
      <p>
        {text}{" "}
        {again ? (
          <a href={signInHref("/")} className={linkClasses}>
            Sign in again
          </a>
        ) : null}
      </p>
    </Notice>
  );
}
