import type { ComponentProps } from "react";
import { buttonLook, type ButtonLook } from "./button-look";

type ButtonProps = ComponentProps<"button"> &
  ButtonLook & {
    /** Set while the act runs: the button stays focusable, says so, and does nothing when pressed again. */
    readonly busy?: boolean;
  };

/** A button that says its act ("Save and tell 3 people"). Type is "button" unless given. */
export function Button({
  variant,
  size,
  wide,
  className,
  busy = false,
  onClick,
  type = "button",
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      aria-busy={busy || undefined}
      aria-disabled={busy || undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
      className={buttonLook({ variant, size, wide, className })}
    />
  );
}
