import { Loading, Skeleton } from "@/components/ui/skeleton";

export default function ExerciseLoading() {
  return (
    <Loading label="Loading the exercise">
      <div className="grid gap-3 rounded-md border border-line bg-paper px-5 py-4">
        <Skeleton className="h-6 w-2/3" />
        <Skeleton className="h-28" />
        <Skeleton className="h-20" />
      </div>
    </Loading>
  );
}
