import type { WithheldGroup } from "#shared/contracts/released-figures.ts";
import { defaultDisclosureParameters } from "#shared/disclosure/parameters.ts";
import { Notice } from "../../ui/notice.tsx";
import { TextLink } from "../../ui/text-link.tsx";

/** Why a group shows nothing, without a number that would say how near it is. */
export function WithheldNotice({ figures }: { figures: WithheldGroup }) {
  const { quorum } = defaultDisclosureParameters;
  if (figures.reason === "quorum") {
    return (
      <Notice title="Not enough shops yet">
        <p className="max-w-text">
          With few shops each could tell what another one sets, so a group shows nothing before {quorum} of them share
          here. How many there are is not shown either. Share a proven recipe of this group and it counts towards it. A
          starting recipe works all the same, from common practice where peers are missing.{" "}
          <TextLink to="/method#rules">The rule</TextLink>
        </p>
      </Notice>
    );
  }
  return (
    <Notice title="Held back in this edition">
      <p className="max-w-text">
        So few shops changed here since the figures were last shown that new ones would give them away, and the old ones
        hold something that was taken back. The group returns with the next edition that is safe.{" "}
        <TextLink to="/method#rules">The rule</TextLink>
      </p>
    </Notice>
  );
}
