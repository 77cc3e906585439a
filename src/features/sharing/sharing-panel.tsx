import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { useState } from "react";
import { type Recipe, type SharingLevel, sharingLevels } from "#shared/contracts/recipes.ts";
import { publicTextLimit, type Sharing } from "#shared/contracts/sharing.ts";
import { ApiProblem } from "../../lib/api-problem.ts";
import { sharingLevelLabels } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button } from "../../ui/button.tsx";
import { ChoiceGroup } from "../../ui/choice-group.tsx";
import { Notice } from "../../ui/notice.tsx";
import { TextAreaField } from "../../ui/text-field.tsx";
import { showToast } from "../../ui/toast-store.ts";
import { PreviewColumns } from "./preview-columns.tsx";
import { sharingPreviewQuery, sharingQuery, useChangeSharing } from "./sharing.queries.ts";
import { actWords, levelHints, notCountedWords, savedWords } from "./sharing-words.ts";
import { useSettled } from "./use-settled.ts";
import { Withdraw } from "./withdraw.tsx";

/** How a recipe is shared, as a part of its page: nothing is saved before its owner has seen what it shows. */
export function SharingPanel({ recipe }: { recipe: Recipe }) {
  const sharing = useSuspenseQuery(sharingQuery(recipe.id)).data;
  return (
    <section aria-labelledby="sharing" className="print:hidden">
      <h2 id="sharing" className="mb-2 text-lg font-bold">
        Sharing: {sharingLevelLabels[sharing.level].toLowerCase()}
      </h2>
      {sharing.notCountedBecause ? (
        <Notice kind="watch" title="Not counted now" className="mb-4">
          {notCountedWords[sharing.notCountedBecause]}
        </Notice>
      ) : null}
      {/* What is chosen here starts from what is saved. */}
      <Choose key={`${sharing.level} ${sharing.publicText}`} recipe={recipe} sharing={sharing} />
    </section>
  );
}

function Choose({ recipe, sharing }: { recipe: Recipe; sharing: Sharing }) {
  const { shop } = useSession();
  const isOwner = shop?.role === "owner";
  const [level, setLevel] = useState<SharingLevel>(sharing.level);
  const [text, setText] = useState(sharing.publicText);
  const { preview, textRefused } = usePreview(recipe.id, sharing, level, text);

  return (
    <div className="space-y-4">
      <div className="grid gap-4 md:grid-cols-2">
        <ChoiceGroup
          type="radio"
          name="sharing-level"
          label={isOwner ? "How far it goes" : "What each level would show"}
          choices={sharingLevels.map((value) => ({
            value,
            label: sharingLevelLabels[value],
            hint: levelHints[value],
          }))}
          value={level}
          onChange={(event) => setLevel(event.target.value as SharingLevel)} // one of the choices above
        />
        {level === "listed" && isOwner ? (
          <TextAreaField
            label="Words for others"
            hint={`Shown beside the copy. No names, places or contacts. ${publicTextLimit - text.length} of ${publicTextLimit} letters left.`}
            optional
            rows={4}
            maxLength={publicTextLimit}
            value={text}
            onChange={(event) => setText(event.target.value)}
            error={textRefused.length > 0 ? `${textRefused.join(". ")}. Take it out.` : undefined}
          />
        ) : null}
      </div>
      {preview ? <PreviewColumns preview={preview} /> : null}
      {isOwner ? (
        <Acts
          {...{ recipe, sharing, level, text }}
          refused={textRefused.length > 0}
          onWithdrawn={() => setLevel("private")}
        />
      ) : (
        <p className="text-sm text-muted">An owner of the shop decides this.</p>
      )}
    </div>
  );
}

/** The chosen level as the server would carry it out; words not saved yet are tried out first. */
function usePreview(recipeId: string, sharing: Sharing, level: SharingLevel, text: string) {
  const settled = useSettled(text, 400);
  const isNew = level === "listed" && settled !== sharing.publicText;
  const { data } = useQuery(sharingPreviewQuery(recipeId, isNew ? settled : undefined));
  const saved = sharing.previews.find((preview) => preview.level === level);
  return isNew && data ? data : { preview: saved, textRefused: [] };
}

interface ActsProps {
  recipe: Recipe;
  sharing: Sharing;
  level: SharingLevel;
  text: string;
  refused: boolean;
  onWithdrawn: () => void;
}

function Acts({ recipe, sharing, level, text, refused, onWithdrawn }: ActsProps) {
  const change = useChangeSharing(recipe.id);
  const isChanged = level !== sharing.level || (level === "listed" && text.trim() !== sharing.publicText);
  const mayShare = recipe.state === "proven";
  const problem = change.error instanceof ApiProblem ? change.error : undefined;

  function save() {
    change.mutate({ level, publicText: text }, { onSuccess: () => showToast(savedWords[level]) });
  }

  return (
    <div className="space-y-3">
      {isChanged && level !== "private" && !mayShare ? (
        <Notice kind="watch" title="Only a proven recipe can be shared">
          {recipe.state === "retired" ? "Bring it back first." : "Log an acceptable test cut first."}
        </Notice>
      ) : null}
      {problem ? (
        <Notice kind="stop" live title={problem.message}>
          {problem.errors.map(({ detail }) => (
            <p key={detail}>{detail}.</p>
          ))}
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-2">
        {isChanged && level !== "private" && mayShare ? (
          <Button kind="primary" pending={change.isPending} disabled={refused} onClick={save}>
            {actWords(sharing.level, level)}
          </Button>
        ) : null}
        {sharing.level === "private" ? null : <Withdraw recipeId={recipe.id} onDone={onWithdrawn} />}
      </div>
    </div>
  );
}
