"use client";

import { useEffect, useState, type RefCallback } from "react";

/** Pixels around the window in which a row is drawn in full. */
const MARGIN = "1200px 0px";

/** Whether an element has come near the window; once it has, it stays so. `first`: whether it starts there. */
export function useNear<E extends Element>(first: boolean): { near: boolean; ref: RefCallback<E> } {
  const [element, ref] = useState<E | null>(null);
  const [near, setNear] = useState(first);
  useEffect(() => {
    if (near || !element) return;
    const observer = new IntersectionObserver(
      (entries) => {
        if (entries.some((entry) => entry.isIntersecting)) setNear(true);
      },
      { rootMargin: MARGIN },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [element, near]);
  return { near, ref };
}
