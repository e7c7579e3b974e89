import Link from "next/link";
import type { ComponentProps } from "react";
import { buttonLook, type ButtonLook } from "./button-look";

/** A link that looks like a button: for what leads to another page. */
export function LinkButton({
  variant,
  size,
  wide,
  className,
  ...rest
}: ComponentProps<typeof Link> & ButtonLook) {
  return <Link {...rest} className={buttonLook({ variant, size, wide, className })} />;
}
