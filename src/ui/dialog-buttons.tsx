import { Button } from "./button.tsx";

export interface DialogButtonsProps {
  /** The act in words, as on the button. */
  act: string;
  kind: "danger" | "primary";
  pending: boolean;
  onClose: () => void;
}

/** The end of a form in a dialog that changes something: the act, and the way out. */
export function DialogButtons({ act, kind, pending, onClose }: DialogButtonsProps) {
  return (
    <div className="flex flex-wrap gap-2">
      <Button type="submit" kind={kind} pending={pending}>
        {act}
      </Button>
      <Button kind="quiet" onClick={onClose}>
        Keep as it is
      </Button>
    </div>
  );
}
