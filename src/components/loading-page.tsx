import { Page } from "./page.tsx";
import { Skeleton, SkeletonGroup } from "./skeleton.tsx";

export interface LoadingPageProps {
  /** What is on its way: "Loading the lineup". */
  label?: string;
}

/** The page while its first content is on its way. Pages with a known shape draw their own skeletons instead. */
export function LoadingPage({ label = "Loading the page" }: LoadingPageProps) {
  return (
    <Page title="Loading">
      <h1 className="sr-only" tabIndex={-1}>
        {label}
      </h1>
      <SkeletonGroup label={label}>
        <Skeleton className="h-8 w-64 max-w-full" />
        <Skeleton shape="ribbon" className="mt-6" />
        <div className="mt-8 grid grid-cols-3 gap-4 max-wide:grid-cols-1">
          {["first", "second", "third"].map((card) => (
            <div key={card} className="rounded-sheet border border-line bg-card p-3 shadow-sheet-1">
              <Skeleton shape="ribbon" className="h-11" />
              <Skeleton className="mt-4 w-2/3" />
              <Skeleton className="mt-3 w-2/5" />
            </div>
          ))}
        </div>
      </SkeletonGroup>
    </Page>
  );
}
