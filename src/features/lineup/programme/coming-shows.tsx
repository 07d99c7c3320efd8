import type { ProgrammeShow } from "../../../../shared/contracts/lineup.ts";
import { DateLeaf } from "../../../components/date-leaf.tsx";
import { List, ListRow } from "../../../components/list.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { formatLocalDate } from "../../../lib/format.ts";

export interface ComingShowsProps {
  shows: readonly ProgrammeShow[];
}

/** A few shows of the published programme, each with its night on a calendar leaf. */
export function ComingShows({ shows }: ComingShowsProps) {
  return (
    <List>
      {shows.map((show) => {
        const date = formatLocalDate(show.date);
        return (
          <ListRow
            key={show.slotId}
            lead={<DateLeaf dateTime={show.date} weekday={date.weekday} day={date.day} label={date.full} />}
            title={show.title}
            line={`${show.startsAt} · ${show.publicName}`}
            ribbon={<PictureRibbon picture={show.ribbon} size="row" label="" />}
          />
        );
      })}
    </List>
  );
}
