/** Look of everything one types or picks in. */
export const CONTROL_LOOK =
  "block w-full min-w-0 min-h-control rounded border border-edge bg-field px-3 py-1.5 text-control text-ink " +
  "placeholder:text-ink-3 disabled:cursor-not-allowed disabled:opacity-60 [&[readonly]]:bg-line-soft " +
  "aria-invalid:border-red-text aria-invalid:shadow-[inset_0_0_0_1px_var(--red-text)]";
