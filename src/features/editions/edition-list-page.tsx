import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import type { Edition } from "#shared/contracts/editions.ts";
import { asProblem } from "../../lib/form-problems.ts";
import { Button } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { BuildPanel } from "./build-panel.tsx";
import { EditionList } from "./edition-list.tsx";
import { allEditionsQuery, buildsQuery, isOpen, useStartBuild } from "./editions.queries.ts";
import { WaitingEdition } from "./waiting-edition.tsx";

/** For admins: build an edition, read what it changes, publish it. */
export function EditionListPage() {
  const { items } = useSuspenseQuery(allEditionsQuery).data;
  // Of several built only the newest can come out; publishing it discards the others.
  const waiting = items.find((edition) => edition.state === "built");
  const others = items.filter((edition) => edition !== waiting);
  return (
    <>
      <PageHeader
        title="Editions"
        facts="Figures change for members only when an edition is published"
        actions={<BuildButton />}
      />
      <BuildPanel />
      {waiting ? <WaitingEdition edition={waiting} /> : null}
      <Past editions={others} none={items.length === 0} />
    </>
  );
}

function Past({ editions, none }: { editions: readonly Edition[]; none: boolean }) {
  if (none) {
    return (
      <EmptyState title="No edition yet" action={<BuildButton />}>
        Until one is published members see no peers. Building counts what the shops share; nothing comes out before you
        publish it.
      </EmptyState>
    );
  }
  return editions.length > 0 ? <EditionList editions={editions} /> : null;
}

function BuildButton() {
  const builds = useQuery(buildsQuery).data?.items;
  const start = useStartBuild();
  const busy = start.isPending || isOpen(builds?.[0]);
  const begin = () =>
    start.mutateAsync().catch((error: unknown) => showToast(asProblem(error).message, { kind: "stop" }));
  return (
    <Button kind="primary" pending={busy} onClick={begin}>
      {isOpen(builds?.[0]) ? "Building…" : "Build an edition"}
    </Button>
  );
}
