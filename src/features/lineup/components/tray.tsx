import { useState } from "react";
import type { Lineup } from "../../../../shared/contracts/lineup.ts";
import type { ForwardId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { Icon } from "../../../components/icon.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Menu } from "../../../components/menu.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";
import {
  listTray,
  presentNights,
  TRAY_ORDER_NAMES,
  TRAY_ORDERS,
  type TrayItem,
  type TrayOrder,
} from "../model/tray.ts";
import type { Carried } from "../use-board.ts";

export interface TrayProps {
  lineup: Lineup;
  carried: Carried | null;
  hintsId: string;
  /** Picks a show up for the keyboard or a press; null where there is no board to put it on. */
  onPickUp: ((forwardId: ForwardId) => void) | null;
  onDragStart: (what: Carried) => void;
  onDragEnd: () => void;
  /** A slot is dropped here: it goes off the plan. */
  onDropSlot: (what: Extract<Carried, { kind: "slot" }>) => void;
  /** The way without dragging: a night and a time from lists. */
  onPlace: (forwardId: ForwardId) => void;
}

/** The approved shows, those with the fewest nights first. */
export function Tray({ lineup, carried, hintsId, onPickUp, onDragStart, onDragEnd, onDropSlot, onPlace }: TrayProps) {
  const [query, setQuery] = useState("");
  const [order, setOrder] = useState<TrayOrder>("fewest");
  const items = listTray(lineup, query, order);
  const isDropTarget = carried?.kind === "slot";
  return (
    <aside
      aria-labelledby="tray-heading"
      className={joinClasses(
        "flex min-h-0 flex-col border-line bg-card wide:border-r",
        isDropTarget && "outline-2 -outline-offset-2 outline-dashed outline-rim",
      )}
      onDragOver={(event) => {
        if (isDropTarget) event.preventDefault();
      }}
      onDrop={() => {
        if (carried?.kind === "slot") onDropSlot(carried);
      }}
    >
      <div className="border-b border-line px-3 py-2.5">
        <div className="flex items-baseline">
          <h2 id="tray-heading">Approved shows</h2>
          <span className="ml-auto text-meta text-slate">{lineup.shows.length}</span>
        </div>
        <div className="mt-1.5 flex items-start gap-1.5">
          <TextField
            label="Find a show, a name or a school"
            isLabelHidden
            placeholder="Show, name or school"
            type="search"
            value={query}
            onChange={(event) => setQuery(event.target.value)}
            className="flex-1 [&_input]:px-2 [&_input]:text-meta"
          />
          <Menu
            isIconOnly
            icon="arrange"
            label={`Order: ${TRAY_ORDER_NAMES[order]}`}
            actions={TRAY_ORDERS.map((one) => ({
              id: one,
              label: TRAY_ORDER_NAMES[one],
              icon: one === order ? "check" : undefined,
              onAction: () => setOrder(one),
            }))}
          />
        </div>
        <p className="mt-1 text-meta text-slate">{TRAY_ORDER_NAMES[order]}</p>
      </div>
      {lineup.shows.length === 0 ? (
        <EmptyState
          className="m-3 flex-col"
          icon="ribbon"
          title="No approved show yet"
          action={<LinkButton to="/event/shows">Look at the shows</LinkButton>}
        >
          Approve a forwarded show, and it waits here for its nights.
        </EmptyState>
      ) : items.length === 0 ? (
        <p className="p-3 text-slate">
          No show fits “{query}”.{" "}
          <Button size="small" look="quiet" onPress={() => setQuery("")}>
            Show all
          </Button>
        </p>
      ) : (
        <ul className="min-h-0 flex-1 overflow-y-auto [scrollbar-width:thin]">
          {items.map((item) => (
            <TrayRow
              key={item.show.id}
              item={item}
              isCarried={carried?.kind === "show" && carried.forwardId === item.show.id}
              hintsId={hintsId}
              onPickUp={onPickUp}
              onDragStart={onDragStart}
              onDragEnd={onDragEnd}
              onPlace={onPlace}
            />
          ))}
        </ul>
      )}
    </aside>
  );
}

interface TrayRowProps extends Pick<TrayProps, "hintsId" | "onPickUp" | "onDragStart" | "onDragEnd" | "onPlace"> {
  item: TrayItem;
  isCarried: boolean;
}

function TrayRow({
  item: { show, nightCount },
  isCarried,
  hintsId,
  onPickUp,
  onDragStart,
  onDragEnd,
  onPlace,
}: TrayRowProps) {
  const act = () => (onPickUp ?? onPlace)(show.id);
  return (
    <li className={joinClasses("border-b border-line", isCarried && "bg-spruce-tint")}>
      {/* A button element cannot be dragged in every browser: this one has its role and its keys. */}
      <div
        role="button"
        tabIndex={0}
        data-tray={show.id}
        aria-pressed={isCarried}
        aria-describedby={hintsId}
        draggable={onPickUp !== null}
        onClick={act}
        onKeyDown={(event) => {
          if (event.key !== " " && event.key !== "Enter") return;
          event.preventDefault();
          act();
        }}
        onDragStart={(event) => {
          event.dataTransfer.effectAllowed = "copy";
          event.dataTransfer.setData("text/plain", show.title);
          onDragStart({ kind: "show", forwardId: show.id });
        }}
        onDragEnd={onDragEnd}
        className="grid cursor-grab grid-cols-[16px_minmax(0,1fr)_auto] items-center gap-x-1.5 gap-y-1 px-3 pt-2 pb-1 -outline-offset-3! hover:bg-well"
      >
        <Icon name="grip" className="size-4 text-rim" />
        <b className="truncate font-[650]">{show.title}</b>
        <span className="text-meta text-slate tabular-nums">
          <span className="sr-only">, </span>
          {presentLength(show.seconds)}
          <span className="sr-only">
            , {show.publicName}, {presentNights(nightCount)}
          </span>
        </span>
        <span className="col-span-2 col-start-2">
          <PictureRibbon picture={show.ribbon} size="row" label="" />
        </span>
      </div>
      <div className="flex items-start gap-1 pr-1.5 pb-1.5 pl-[34px] text-meta leading-tight text-slate">
        <span className="min-w-0 flex-1 pt-0.5 wrap-anywhere">
          {show.publicName} · {nightCount === 0 ? <strong>not placed yet</strong> : presentNights(nightCount)}
        </span>
        <Button
          size="small"
          look="quiet"
          className="min-h-6! px-1.5!"
          aria-label={`Place ${show.title}…`}
          onPress={() => onPlace(show.id)}
        >
          Place…
        </Button>
      </div>
    </li>
  );
}
