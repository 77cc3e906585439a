import type { Member } from "#shared/contracts/members.ts";
import { formatShortDate } from "#shared/units/dates.ts";
import { formatCount } from "#shared/units/format.ts";
import { StateWord } from "../../ui/notice.tsx";
import { type Column, Table } from "../../ui/table.tsx";
import { MemberActs } from "./member-acts.tsx";

const columns: Column<Member>[] = [
  { key: "name", header: "Shop", rowHeader: true, cell: (m) => <span className="break-words">{m.name}</span> },
  { key: "place", header: "Place", cell: (m) => m.place },
  { key: "state", header: "State", cell: (m) => <MemberState member={m} /> },
  { key: "joined", header: "Joined", numeric: true, cell: (m) => formatShortDate(m.joinedAt) },
  { key: "people", header: "People", numeric: true, cell: (m) => formatCount(m.people) },
  { key: "machines", header: "Machines", numeric: true, cell: (m) => formatCount(m.machines) },
  { key: "shared", header: "Recipes shared", numeric: true, cell: (m) => formatCount(m.sharedRecipes) },
  { key: "acts", header: "Acts", hideHeader: true, numeric: true, cell: (m) => <MemberActs member={m} /> },
];

export function MemberTable({ members }: { members: readonly Member[] }) {
  return (
    <Table
      caption="Members by name"
      columns={columns}
      rows={members}
      rowKey={(m) => m.id}
      renderCard={(m) => <MemberCard member={m} />}
    />
  );
}

function MemberState({ member }: { member: Member }) {
  if (member.state === "active") return <StateWord kind="sound">Active</StateWord>;
  return (
    <>
      <StateWord kind="stop">Suspended</StateWord>
      {member.stateReason ? (
        <span className="block max-w-xs text-sm break-words text-muted">{member.stateReason}</span>
      ) : null}
    </>
  );
}

const counted = (count: number, one: string, many: string) => `${formatCount(count)}\u00a0${count === 1 ? one : many}`;

function MemberCard({ member }: { member: Member }) {
  return (
    <>
      <b className="break-words">{member.name}</b>
      <p className="text-soft">
        {member.place} · joined {formatShortDate(member.joinedAt)}
      </p>
      <p className="mb-2 text-sm text-muted">
        {counted(member.people, "person", "people")} · {counted(member.machines, "machine", "machines")} ·{" "}
        {counted(member.sharedRecipes, "recipe shared", "recipes shared")}
      </p>
      <div className="flex items-start justify-between gap-4">
        <div>
          <MemberState member={member} />
        </div>
        <MemberActs member={member} />
      </div>
    </>
  );
}
