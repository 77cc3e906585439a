import { type RefObject, useLayoutEffect, useRef, useState } from "react";

/** The width an element has now, in px; `before` until it can be measured. */
export function useWidth<Element extends HTMLElement>(before: number): [RefObject<Element | null>, number] {
  const element = useRef<Element>(null);
  const [width, setWidth] = useState(before);

  useLayoutEffect(() => {
    const observed = element.current;
    if (!observed) return;
    const measure = () => {
      // Nothing is laid out while hidden; keep the last known width.
      if (observed.clientWidth > 0) setWidth(observed.clientWidth);
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(observed);
    return () => observer.disconnect();
  }, []);

  return [element, width];
}
