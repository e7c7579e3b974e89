import { Loading, Skeleton } from "@/components/ui/skeleton";

const WEEKS = 6;

export default function CampLoading() {
  return (
    <Loading label="Loading the camp">
      <div className="flex items-end gap-6 pb-3.5">
        <Skeleton className="h-[88px] w-32" />
        <div className="grid flex-1 gap-2">
          <Skeleton className="h-7 w-80 max-w-full" />
          <Skeleton className="h-4 w-[520px] max-w-full" />
        </div>
      </div>
      <Skeleton className="h-60 w-full" />
      <div className="mt-4 grid gap-4 lg:grid-cols-[minmax(0,1fr)_356px]">
        <div className="grid gap-px">
          {Array.from({ length: WEEKS }, (_, week) => (
            <Skeleton key={week} className="h-28 w-full" />
          ))}
        </div>
        <Skeleton className="h-44 w-full" />
      </div>
    </Loading>
  );
}
