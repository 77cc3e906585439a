import { useSession, useSignOut } from "../../shell/session.queries.ts";
import { Button, ButtonLink } from "../../ui/button.tsx";
import { PageHeader } from "../../ui/page-header.tsx";

/** The only page of a suspended shop's people. */
export function Suspended({ shopName }: { shopName: string }) {
  const { admin } = useSession();
  const signOut = useSignOut();
  return (
    <>
      <PageHeader title={`${shopName} is suspended`} facts="An admin of the network has done this" />
      <ul className="max-w-text list-disc space-y-2 pl-5">
        <li>Nobody in the shop can read or write in the network until an admin reinstates it.</li>
        <li>The book is whole: recipes, test cuts and machines are kept, and come back as they were.</li>
        <li>What the shop shares leaves the next edition. Editions already published stay as they are.</li>
      </ul>
      <p className="mt-4 max-w-text">Ask the network's admin for the reason and for what would lift it.</p>
      <div className="mt-6 flex flex-wrap gap-2">
        {admin ? <ButtonLink to="/members">Members</ButtonLink> : null}
        <Button kind="primary" pending={signOut.isPending || signOut.isSuccess} onClick={() => signOut.mutateAsync()}>
          Sign out
        </Button>
      </div>
    </>
  );
}
