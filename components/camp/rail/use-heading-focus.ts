"use client";

import { useCallback, useRef, type RefCallback } from "react";

export interface HeadingFocus {
  readonly ref: RefCallback<HTMLHeadingElement>;
  /** Gives the heading the focus: now, or as soon as the rail is there. */
  readonly wanted: () => void;
}

/** After a drop by keys the rail is next; it may still be on its way from the server. */
export function useHeadingFocus(): HeadingFocus {
  const heading = useRef<HTMLHeadingElement | null>(null);
  const waiting = useRef(false);
  const ref = useCallback((node: HTMLHeadingElement | null) => {
    heading.current = node;
    if (!node || !waiting.current) return;
    waiting.current = false;
    node.focus();
  }, []);
  const wanted = useCallback(() => {
    waiting.current = true;
    // The heading is drawn with the drop; it can take the focus once that has happened.
    requestAnimationFrame(() => {
      if (!heading.current || !waiting.current) return;
      waiting.current = false;
      heading.current.focus();
    });
  }, []);
  return { ref, wanted };
}
