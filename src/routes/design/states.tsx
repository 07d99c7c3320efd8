import { Button } from "../../components/button.tsx";
import { Card, CardHeader } from "../../components/card.tsx";
import { EmptyState } from "../../components/empty-state.tsx";
import { ErrorState } from "../../components/error-state.tsx";
import { Ribbon } from "../../components/ribbon.tsx";
import { Skeleton, SkeletonGroup } from "../../components/skeleton.tsx";
import { GallerySection } from "./gallery-section.tsx";
import { SAMPLE_RIBBONS } from "./sample-ribbons.ts";

const retry = () => undefined;

/** Empty, loading and failed. */
export function States() {
  return (
    <GallerySection title="Empty, loading, failed">
      <EmptyState
        title="No show yet"
        picture={<Ribbon ribbon={SAMPLE_RIBBONS.first} label="" />}
        action={<Button icon="plus">New show</Button>}
      >
        Your first show begins in lesson 1. Its first threads will look like this.
      </EmptyState>
      <EmptyState title="Nothing waits for marking" icon="tick">
        Work appears here when a student hands it in.
      </EmptyState>
      <div className="grid grid-cols-2 gap-4 max-wide:grid-cols-1">
        <Card as="section" aria-labelledby="gallery-card">
          <CardHeader
            titleId="gallery-card"
            title="Who needs you"
            detail="3 hands"
            actions={<Button size="small">All seen</Button>}
            level={3}
          />
          <div className="p-4">A card with a head.</div>
        </Card>
        <Card isLifted isPadded>
          <SkeletonGroup label="Loading the class">
            <Skeleton className="w-1/3" />
            <Skeleton className="mt-3 w-2/3" />
            <Skeleton shape="block" className="mt-4 h-16" />
          </SkeletonGroup>
        </Card>
      </div>
      <ErrorState title="The class could not be loaded." onRetry={retry} requestId="req-7f3a21">
        <p>Nothing is lost. Try again, or come back in a minute.</p>
      </ErrorState>
    </GallerySection>
  );
}
