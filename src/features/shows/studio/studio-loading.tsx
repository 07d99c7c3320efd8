import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";

export interface StudioLoadingProps {
  title: string;
}

/** The studio before the draft is open: the same sheets, empty. */
export function StudioLoading({ title }: StudioLoadingProps) {
  return (
    <div className="studio">
      <header className="studio-head">
        <div className="studio-title">
          <h1>{title}</h1>
        </div>
      </header>
      <SkeletonGroup label="Opening the studio" className="studio-columns">
        <div className="studio-song">
          <div className="studio-window" />
          <Skeleton shape="block" className="h-[60px]" />
          <Skeleton shape="ribbon" className="h-[189px]" />
        </div>
        <Skeleton shape="block" className="h-full" />
      </SkeletonGroup>
    </div>
  );
}
