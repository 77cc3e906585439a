import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useRef } from "react";
import type { EditionBuild } from "#shared/contracts/editions.ts";
import { formatInstant } from "#shared/units/dates.ts";
import { formatCount } from "#shared/units/format.ts";
import { Notice } from "../../ui/notice.tsx";
import { Progress } from "../../ui/progress.tsx";
import { allEditionsQuery, buildsQuery, isOpen } from "./editions.queries.ts";

/** How the newest build is getting on. It runs on the server, whoever looks. */
export function BuildPanel() {
  const newest = useQuery(buildsQuery).data?.items[0];
  useNewEditionWhenDone(newest);
  if (!newest || newest.state === "done") return null;
  return (
    <div className="mb-6">
      {newest.state === "failed" ? (
        <Notice kind="stop" live title="The last build failed">
          <p>
            {newest.message || "It stopped without saying why."} The published edition stands; nothing of the build was
            kept.
          </p>
          <p className="text-sm text-soft">Asked for {formatInstant(newest.requestedAt)}</p>
        </Notice>
      ) : (
        <RunningBuild build={newest} />
      )}
    </div>
  );
}

function RunningBuild({ build }: { build: EditionBuild }) {
  const { groupsDone, groupsTotal } = build;
  const known = groupsTotal !== null && groupsTotal > 0;
  return (
    <div className="rounded border border-line bg-surface p-4 md:p-5">
      <Progress
        label={build.state === "queued" ? "Waiting to be built" : "Building an edition"}
        {...(known
          ? {
              value: groupsDone / groupsTotal,
              text: `${formatCount(groupsDone)} of ${formatCount(groupsTotal)} groups`,
            }
          : {})}
      />
      <p className="mt-3 text-soft">You may leave this page: it goes on by itself. Members see nothing of it yet.</p>
    </div>
  );
}

/** The list learns of the edition at the moment its build ends. */
function useNewEditionWhenDone(newest: EditionBuild | undefined): void {
  const queries = useQueryClient();
  const wasOpen = useRef(false);
  const open = isOpen(newest);
  useEffect(() => {
    if (wasOpen.current && !open) void queries.invalidateQueries({ queryKey: allEditionsQuery.queryKey });
    wasOpen.current = open;
  }, [open, queries]);
}
