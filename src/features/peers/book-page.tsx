import { useSuspenseQuery } from "@tanstack/react-query";
import { formatDate } from "#shared/units/dates.ts";
import { PageHeader } from "../../ui/page-header.tsx";
import { BookAgainstPeers } from "./book-against-peers.tsx";
import { NoEditionYet } from "./no-edition-yet.tsx";
import { bookRankingQuery } from "./peers.queries.ts";

export function BookAgainstPeersPage() {
  const { edition } = useSuspenseQuery(bookRankingQuery).data;
  return (
    <>
      <PageHeader
        title="My book against peers"
        back={{ to: "/peers", label: "Peers" }}
        facts={edition ? `Edition of ${formatDate(edition.date)}` : null}
      />
      {edition ? <BookAgainstPeers /> : <NoEditionYet />}
    </>
  );
}
