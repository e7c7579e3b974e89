import type { WaitingView } from "@/lib/schemas/suggestion";

/** "2 suggestions, 1 request"; empty where nothing waits. */
export function waitingText({
  suggestions,
  requests,
}: Pick<WaitingView, "suggestions" | "requests">): string {
  const count = (many: readonly unknown[], noun: string): string[] =>
    many.length === 0 ? [] : [`${many.length} ${noun}${many.length === 1 ? "" : "s"}`];
  return [...count(suggestions, "suggestion"), ...count(requests, "request")].join(", ");
}
