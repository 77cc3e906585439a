import { useSuspenseQuery } from "@tanstack/react-query";
import { useNavigate, useParams } from "react-router-dom";
import { CautionsLine } from "../../lib/cautions.tsx";
import { recipeQuery } from "../../lib/recipe-queries.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { TestCutForm } from "./test-cut-form.tsx";
import { useRecordTestCut } from "./test-cuts.queries.ts";

export function NewTestCutPage() {
  const { id = "" } = useParams();
  const { units } = useSession();
  const navigate = useNavigate();
  const recipe = useSuspenseQuery(recipeQuery(id)).data;
  const record = useRecordTestCut(id);
  const { content, number } = recipe.version;
  const name = recipeName(content, units);

  return (
    <>
      <PageHeader
        title="Log a test cut"
        facts={`${name} · ${recipe.machineName} · version ${number}`}
        back={{ to: `/recipes/${id}`, label: name }}
      />
      {recipe.state === "retired" ? (
        <Notice kind="watch" title="This recipe is retired">
          It takes no test cuts. Bring it back first.
        </Notice>
      ) : (
        <div className="space-y-6">
          <TestCutForm
            recipe={recipe}
            units={units}
            onSave={async (cut, key) => {
              await record.mutateAsync({ cut, key });
              const proves = cut.acceptable && cut.versionNumber === number && !recipe.version.proven;
              showToast(proves ? "Logged. The recipe is proven." : "Logged.");
              await navigate(`/recipes/${id}`);
            }}
          />
          <CautionsLine material={content.material} gas={content.processGas} currentA={content.setpoints.currentA} />
        </div>
      )}
    </>
  );
}
