import { ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";

/** Before the first edition there is nothing to compare with, and a reason for it. */
export function NoEditionYet() {
  const actions = (
    <>
      <ButtonLink to="/recipes" kind="primary">
        Open the book
      </ButtonLink>
      <ButtonLink to="/method">How the figures are made</ButtonLink>
    </>
  );
  return (
    <EmptyState title="No edition is published yet" action={actions}>
      Figures come out in dated editions, all at once, so that nobody can watch a single shop change. The first one
      follows when enough shops share proven recipes. Prove a recipe with a test cut and share it, and it counts.
    </EmptyState>
  );
}
