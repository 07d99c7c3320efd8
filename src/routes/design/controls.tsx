import { useState } from "react";
import { Button } from "../../components/button.tsx";
import { IconButton } from "../../components/icon-button.tsx";
import { Kbd, KeyHints } from "../../components/kbd.tsx";
import { LinkButton } from "../../components/link-button.tsx";
import { Menu } from "../../components/menu.tsx";
import { Notice } from "../../components/notice.tsx";
import { Tabs } from "../../components/tabs.tsx";
import { Tag, type TagState } from "../../components/tag.tsx";
import { showToast } from "../../components/toast-queue.ts";
import { Tooltip } from "../../components/tooltip.tsx";
import { GallerySection } from "./gallery-section.tsx";

const TAGS: TagState[] = [
  "working",
  "submitted",
  "revise",
  "marked",
  "waiting",
  "approved",
  "declined",
  "scheduled",
  "ok",
  "note",
  "warn",
  "stop",
];

const noAct = () => undefined;

/** Buttons, tags, notices, tabs, menus. */
export function Controls() {
  const [isOn, setIsOn] = useState(false);
  return (
    <>
      <GallerySection title="Buttons">
        <div className="flex flex-wrap items-center gap-3">
          <Button look="main" icon="play">
            Run
          </Button>
          <Button icon="turn">Start over</Button>
          <Button look="quiet" icon="hand">
            Ask for help
          </Button>
          <Button look="stop" icon="trash">
            Delete the show
          </Button>
          <Button look="main" isPending>
            Handing in
          </Button>
          <Button iconEnd="chevron-right" disabledReason="Run the script once; then this step opens.">
            Change
          </Button>
          <LinkButton to="/design" icon="plus">
            New show
          </LinkButton>
        </div>
        <div className="flex flex-wrap items-center gap-3">
          <Button look="main" size="large" iconEnd="arrow-right">
            Sign in
          </Button>
          <Button size="small">Look</Button>
          <Button size="small" look="main">
            Read and fix
          </Button>
          <IconButton icon="chevron-left" label="Previous" />
          <IconButton icon="settings" label="Settings" look="rim" />
          <IconButton icon="eye" label="Show the words" isPressed={isOn} onPress={() => setIsOn(!isOn)} look="rim" />
          <Tooltip text="Back to the start of the song">
            <IconButton icon="rewind" label="Back to the start" />
          </Tooltip>
          <Menu
            label="More"
            actions={[
              { id: "copy", label: "Make a copy", icon: "copy", onAction: noAct },
              {
                id: "move",
                label: "Hand to another class",
                icon: "send",
                onAction: noAct,
                disabledReason: "You teach one class.",
              },
              { id: "delete", label: "Delete the show", icon: "trash", onAction: noAct, tone: "stop" },
            ]}
          />
        </div>
        <div className="flex flex-wrap items-center gap-3 rounded-sheet on-dusk bg-dusk p-4">
          <Button look="lamp" icon="play">
            Carry on
          </Button>
          <Button look="ghost">Another song</Button>
          <Button look="ghost" disabledReason="Nothing has changed since the last run.">
            Save
          </Button>
          <IconButton icon="play" label="Play" look="lamp" />
          <IconButton icon="volume" label="Volume" />
          <a href="#buttons">A link on dusk</a>
        </div>
      </GallerySection>
      <GallerySection title="Tags">
        <div className="flex flex-wrap gap-2">
          {TAGS.map((state) => (
            <Tag key={state} state={state} />
          ))}
          <Tag state="scheduled">On the square</Tag>
          <Tag state="plain" icon="lock">
            Frozen
          </Tag>
        </div>
      </GallerySection>
      <GallerySection title="Notices">
        <Notice title="Your draft was saved on this laptop.">It goes to the server when the network is back.</Notice>
        <Notice tone="ok" title="Nine Foxes is handed in." />
        <Notice tone="warn" title="The due date has passed." actions={<Button size="small">Hand in late</Button>}>
          You can still hand in; your teacher sees when it came.
        </Notice>
        <Notice tone="stop" title="This show cannot be forwarded yet.">
          Bar 21 flashes more than three times a second. This is a planning aid: the venue&apos;s safety officer
          decides.
        </Notice>
        <div className="flex flex-wrap gap-2">
          <Button onPress={() => showToast({ title: "Saved." })}>Say that it is saved</Button>
          <Button
            onPress={() =>
              showToast({
                tone: "info",
                title: "Nine Foxes went to the tray.",
                action: { label: "Undo", onPress: noAct },
              })
            }
          >
            Offer undo
          </Button>
          <Button
            onPress={() =>
              showToast({
                tone: "stop",
                title: "The mark was not released.",
                detail: "The network is away. Try again in a minute.",
              })
            }
          >
            Say that it failed
          </Button>
        </div>
      </GallerySection>
      <GallerySection title="Tabs and keys">
        <Tabs
          label="Who is signing in"
          tabs={[
            {
              id: "student",
              label: "I am a student",
              icon: "book",
              content: <p>Class code, user name, four words.</p>,
            },
            { id: "staff", label: "I am staff", icon: "people", content: <p>Work e-mail and password.</p> },
          ]}
        />
        <p>
          Press <Kbd>Space</Kbd> to play.
        </p>
        <KeyHints
          hints={[
            { keys: ["J", "K"], does: "next, previous" },
            { keys: ["1", "4"], does: "level" },
            { keys: ["G"], does: "release" },
          ]}
        />
      </GallerySection>
    </>
  );
}
