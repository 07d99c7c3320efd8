import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";

/** The desk's three columns while the queue or a submission is on its way. */
export function DeskSkeleton() {
  return (
    <SkeletonGroup
      label="Loading the marking desk"
      className="grid flex-1 grid-cols-[222px_minmax(0,1fr)_396px] bg-card max-wide:grid-cols-1"
    >
      <h1 className="sr-only" tabIndex={-1}>
        Loading the marking desk
      </h1>
      <div className="space-y-4 border-r border-line p-3 max-wide:hidden">
        {["first", "second", "third", "fourth"].map((row) => (
          <div key={row} className="space-y-2">
            <Skeleton className="w-28" />
            <Skeleton shape="ribbon" className="h-3.5!" />
          </div>
        ))}
      </div>
      <div className="bg-well">
        <div className="bg-card px-4 py-3">
          <Skeleton className="h-6 w-56" />
        </div>
        <div className="h-[226px] skeleton bg-stage! [--sweep:var(--color-thread-lit)]" />
        <Skeleton shape="ribbon" className="h-[62px]!" />
        <div className="space-y-3 bg-card p-4">
          <Skeleton className="w-2/3" />
          <Skeleton className="w-1/2" />
          <Skeleton className="w-3/5" />
        </div>
      </div>
      <div className="space-y-6 border-l border-line bg-paper p-4">
        {["first", "second", "third", "fourth"].map((row) => (
          <div key={row} className="space-y-2">
            <Skeleton className="w-40" />
            <Skeleton shape="block" className="h-8" />
          </div>
        ))}
      </div>
    </SkeletonGroup>
  );
}
