import { useSuspenseQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { Application } from "#shared/contracts/applications.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { EmptyState } from "../../ui/empty-state.tsx";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { Tabs } from "../../ui/tabs.tsx";
import { applicationsQuery } from "./applications.queries.ts";
import { DecidedTable } from "./decided-table.tsx";
import { WaitingApplication } from "./waiting-application.tsx";

const firstShown = { shown: "waiting" };

/** For admins: who asks to join, the longest waiting first, and what was decided. */
export function ApplicationListPage() {
  const { items } = useSuspenseQuery(applicationsQuery).data;
  const [overtaken, setOvertaken] = useState<Application>();
  const [{ shown }, change] = useUrlState(firstShown);
  const waiting = items.filter((application) => application.state === "waiting");
  const decided = items.filter((application) => application.state !== "waiting");

  return (
    <>
      <PageHeader title="Applications" facts={waitingFacts(waiting.length)} />
      {overtaken ? <Overtaken application={items.find(({ id }) => id === overtaken.id) ?? overtaken} /> : null}
      <Tabs
        label="Applications"
        selected={shown}
        onSelect={(key) => change({ shown: key })}
        tabs={[
          {
            key: "waiting",
            label: "Waiting",
            content: <WaitingList applications={waiting} onOvertaken={setOvertaken} />,
          },
          { key: "decided", label: "Decided", content: <DecidedTable applications={decided} /> },
        ]}
      />
    </>
  );
}

interface WaitingListProps {
  applications: readonly Application[];
  onOvertaken: (application: Application) => void;
}

function WaitingList({ applications, onOvertaken }: WaitingListProps) {
  if (applications.length === 0) {
    return (
      <EmptyState title="No application waits">
        A shop asks to join on the first page. Its application appears here.
      </EmptyState>
    );
  }
  return (
    <ul className="space-y-4">
      {applications.map((application) => (
        <li key={application.id}>
          <WaitingApplication application={application} onOvertaken={() => onOvertaken(application)} />
        </li>
      ))}
    </ul>
  );
}

const waitingFacts = (count: number) =>
  count === 0 ? "None waits" : count === 1 ? "One waits for a decision" : `${count} wait for a decision`;

const decisions = { waiting: "decided", admitted: "admitted", declined: "declined" };

function Overtaken({ application }: { application: Application }) {
  return (
    <Notice
      kind="watch"
      live
      title={`${application.shopName} had been ${decisions[application.state]} already`}
      className="mb-6"
    >
      Another admin was quicker. That decision stands; yours changed nothing.
    </Notice>
  );
}
