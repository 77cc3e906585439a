const prefix = "draft:";
const writerKey = "drafts-of";

/** What was typed into a form and not yet sent, kept for this tab only, so an ended session or a reload loses nothing. */
export function readDraft(formId: string): Record<string, unknown> | undefined {
  try {
    const text = sessionStorage.getItem(prefix + formId);
    return text === null ? undefined : (JSON.parse(text) as Record<string, unknown>);
  } catch {
    return undefined; // storage refused or unreadable: the form starts as it would without a draft
  }
}

export function keepDraft(formId: string, values: unknown): void {
  try {
    sessionStorage.setItem(prefix + formId, JSON.stringify(values));
  } catch {
    // storage full or refused: the form itself still holds what was typed
  }
}

export function dropDraft(formId: string): void {
  try {
    sessionStorage.removeItem(prefix + formId);
  } catch {
    // nothing was kept either
  }
}

/** At sign-out: the next person at this screen must not find them. */
export function dropAllDrafts(): void {
  try {
    const names = Object.keys(sessionStorage).filter((name) => name.startsWith(prefix));
    for (const name of names) sessionStorage.removeItem(name);
  } catch {
    // nothing was kept either
  }
}

/** Somebody else at this screen, after a session that ended by itself, must not find them either. */
export function dropDraftsOfOthers(userId: string): void {
  try {
    const writer = sessionStorage.getItem(writerKey);
    if (writer !== null && writer !== userId) dropAllDrafts();
    sessionStorage.setItem(writerKey, userId);
  } catch {
    // nothing was kept either
  }
}
