import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";

export default function ExerciseNotFound() {
  return (
    <EmptyState
      title="There is no such exercise"
      action={<LinkButton href="/exercises">All exercises</LinkButton>}
    >
      It is in neither the library nor what this team added.
    </EmptyState>
  );
}
