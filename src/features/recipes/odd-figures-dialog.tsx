import { Button } from "../../ui/button.tsx";
import { Dialog } from "../../ui/dialog.tsx";

export interface OddFiguresDialogProps {
  questions: readonly string[] | undefined;
  onAnswer: (keep: boolean) => void;
}

/** Asks about figures that are allowed but seldom right, before they are kept. */
export function OddFiguresDialog({ questions, onAnswer }: OddFiguresDialogProps) {
  return (
    <Dialog
      open={questions !== undefined}
      onClose={() => onAnswer(false)}
      title={questions?.length === 1 ? "Is this figure right?" : "Are these figures right?"}
      actions={
        <>
          <Button kind="primary" onClick={() => onAnswer(false)}>
            Go back and change
          </Button>
          <Button onClick={() => onAnswer(true)}>Keep it anyway</Button>
        </>
      }
    >
      <ul className="list-disc space-y-2 pl-5">
        {questions?.map((question) => (
          <li key={question}>{question}</li>
        ))}
      </ul>
    </Dialog>
  );
}
