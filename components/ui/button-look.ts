import { classNames } from "./class-names";

export type ButtonVariant = "primary" | "plain" | "quiet" | "danger";
export type ButtonSize = "normal" | "small";

const VARIANTS: Record<ButtonVariant, string> = {
  primary: "border-ink bg-ink text-ink-on hover:bg-ink-2 hover:border-ink-2",
  plain: "border-ink bg-transparent text-ink hover:bg-line-soft",
  quiet: "border-transparent bg-transparent text-ink hover:bg-line-soft",
  danger: "border-red-fill bg-red-fill text-red-on hover:bg-ink hover:border-ink hover:text-ink-on",
};

const SIZES: Record<ButtonSize, string> = {
  normal: "min-h-control px-4 py-1.5 text-base",
  small: "min-h-control-small px-3 py-1 text-sm",
};

export interface ButtonLook {
  readonly variant?: ButtonVariant;
  readonly size?: ButtonSize;
  /** Takes the whole width. */
  readonly wide?: boolean;
  readonly className?: string;
}

/** One look for what acts (button) and what leads elsewhere (link). */
export function buttonLook({
  variant = "plain",
  size = "normal",
  wide = false,
  className,
}: ButtonLook): string {
  return classNames(
    "inline-flex items-center justify-center gap-2 rounded border font-semibold whitespace-nowrap",
    "disabled:cursor-not-allowed disabled:opacity-50 aria-disabled:opacity-50",
    VARIANTS[variant],
    SIZES[size],
    wide && "w-full",
    className,
  );
}
