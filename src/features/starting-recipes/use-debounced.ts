import { useEffect, useState } from "react";

/** A value once it has stood still for `ms`. Compared by content, since answers are made anew at each render. */
export function useDebounced<Value>(value: Value, ms: number): Value {
  const content = JSON.stringify(value);
  const [settled, setSettled] = useState(content);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(content), ms);
    return () => clearTimeout(timer);
  }, [content, ms]);
  return JSON.parse(settled) as Value; // made by JSON.stringify just above
}
