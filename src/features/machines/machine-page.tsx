import { useSuspenseQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useNavigate, useParams } from "react-router-dom";
import type { Machine } from "#shared/contracts/machines.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button } from "../../ui/button.tsx";
import { ConfirmDialog } from "../../ui/confirm-dialog.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { MachineFacts } from "./machine-facts.tsx";
import { MachineForm } from "./machine-form.tsx";
import { machineQuery, useDeleteMachine, useSaveMachine } from "./machines.queries.ts";

const back = { to: "/machines", label: "Machines" };

export function NewMachinePage() {
  const { units } = useSession();
  const navigate = useNavigate();
  const save = useSaveMachine();
  return (
    <>
      <PageHeader title="Add a machine" back={back} />
      <MachineForm
        units={units}
        onSave={async (input, key) => {
          await save.mutateAsync({ input, key });
          showToast(`${input.name} is kept.`);
          await navigate("/machines");
        }}
      />
    </>
  );
}

/** Owners change it, operators read it. */
export function MachinePage() {
  const { id = "" } = useParams();
  const { units, shop } = useSession();
  const machine = useSuspenseQuery(machineQuery(id)).data;
  const save = useSaveMachine(machine);
  const mayChange = shop?.role === "owner";
  return (
    <>
      <PageHeader title={machine.name} back={back} actions={mayChange ? <DeleteMachine machine={machine} /> : null} />
      {mayChange ? (
        <MachineForm
          // A save moves the version on: the form then starts from what was saved.
          key={machine.version}
          units={units}
          machine={machine}
          onSave={async (input, key) => {
            await save.mutateAsync({ input, key });
            showToast("Changes are saved.");
          }}
        />
      ) : (
        <MachineFacts machine={machine} units={units} />
      )}
    </>
  );
}

function DeleteMachine({ machine }: { machine: Machine }) {
  const [open, setOpen] = useState(false);
  const navigate = useNavigate();
  const remove = useDeleteMachine(machine.id);
  if (machine.recipes > 0) return null;
  return (
    <>
      <Button kind="danger" onClick={() => setOpen(true)}>
        Remove
      </Button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title={`Remove ${machine.name}?`}
        act="Remove machine"
        pending={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(undefined, { onSuccess: () => navigate("/machines") })}
      >
        Its description and your note on it are gone for good. No recipe was made for it.
      </ConfirmDialog>
    </>
  );
}
