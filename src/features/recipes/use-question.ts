import { useState } from "react";

interface Open<Asked, Answer> {
  asked: Asked;
  resolve: (answer: Answer) => void;
}

/** A question put in the middle of an act: the act waits for what the dialog answers. */
export function useQuestion<Asked, Answer>() {
  const [open, setOpen] = useState<Open<Asked, Answer>>();
  return {
    asked: open?.asked,
    ask: (asked: Asked) => new Promise<Answer>((resolve) => setOpen({ asked, resolve })),
    answer: (answer: Answer) => {
      open?.resolve(answer);
      setOpen(undefined);
    },
  };
}
