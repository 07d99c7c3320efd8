import { LinkButton } from "./link-button.tsx";
import { Page, PageHeader } from "./page.tsx";
import { StreetScene } from "./street-scene.tsx";

export interface NotFoundPageProps {
  /** What was looked for, if known: "This show". */
  thing?: string;
  home?: string;
}

/** For an address that leads nowhere, and for a thing that is not there for this person (the two look the same on purpose). */
export function NotFoundPage({ thing = "This page", home = "/" }: NotFoundPageProps) {
  return (
    <Page title="Not found">
      <PageHeader
        title={`${thing} is not here`}
        lead="The address may be mistyped, it may have been deleted, or it may belong to another class."
      />
      <StreetScene
        fronts={9}
        seed={21}
        lighting="one"
        className="mb-6 h-44 overflow-hidden rounded-sheet shadow-sheet-2"
      />
      <LinkButton to={home} look="main" icon="home">
        Go to the start
      </LinkButton>
    </Page>
  );
}
