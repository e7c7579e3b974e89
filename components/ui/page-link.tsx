import type { ComponentProps } from "react";

/**
 * A link that loads its page whole. For pages without an account and those that only say something: the router's own link, and
 * the pages it would fetch ahead, are more script than they have themselves.
 */
export function PageLink(props: ComponentProps<"a">) {
  return <a {...props} />;
}
