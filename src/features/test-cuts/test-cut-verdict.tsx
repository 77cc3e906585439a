import { StateWord } from "../../ui/notice.tsx";

export function TestCutVerdict({ acceptable }: { acceptable: boolean }) {
  return acceptable ? (
    <StateWord kind="sound">Acceptable</StateWord>
  ) : (
    <StateWord kind="stop">Not acceptable</StateWord>
  );
}
