/** Joins the class names that hold; what is false, null or undefined is left out. */
export function classNames(...parts: readonly (string | false | null | undefined)[]): string {
  return parts.filter(Boolean).join(" ");
}
