import { Page, PageHeader } from "../components/page.tsx";
import { StreetScene } from "../components/street-scene.tsx";
import { Button } from "../components/button.tsx";
import { Icon } from "../components/icon.tsx";
import { ICON_NAMES } from "../components/icon-paths.ts";
import { Notice } from "../components/notice.tsx";
import { Tag } from "../components/tag.tsx";

export function Component() {
  return (
    <Page title="Design">
      <PageHeader title="Hello, Wren" lead="Every part" tag={<Tag state="working" />} actions={<Button look="main" icon="play">Run</Button>} />
      <StreetScene fronts={9} seed={12} className="h-60 overflow-hidden rounded-sheet" />
      <div className="flex flex-wrap gap-3 py-4">
        <Button look="plain" disabledReason="Write one line first.">Change</Button>
        <Button look="quiet" icon="hand">Ask for help</Button>
      </div>
      <Notice title="Saved here">Fine.</Notice>
      <div className="flex flex-wrap gap-3 py-4 text-5">
        {ICON_NAMES.map((name) => <span key={name} title={name}><Icon name={name} className="size-8" /></span>)}
      </div>
    </Page>
  );
}
