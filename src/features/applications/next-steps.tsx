const steps = [
  ["An admin reads it", "A person, not a rule. They see what you typed here and nothing else."],
  ["You look here", "No e-mail is sent. Sign in with the address you gave: the first page says how it was decided."],
  [
    "Admitted",
    "Your next sign-in opens the shop's book, with you as its owner. Describe the table, then write down the first recipe.",
  ],
  ["Declined", "You read the reason there, and may ask again."],
] as const;

/** What becomes of an application, for whoever has sent one or is about to. */
export function NextSteps() {
  return (
    <ol className="max-w-text border-t border-line">
      {steps.map(([name, text]) => (
        <li key={name} className="grid gap-x-6 border-b border-line py-3 sm:grid-cols-[9rem_1fr]">
          <b>{name}</b>
          <span className="text-soft">{text}</span>
        </li>
      ))}
    </ol>
  );
}
