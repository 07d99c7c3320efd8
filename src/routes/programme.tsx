import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { Link, useSearchParams } from "react-router";
import { Button } from "../components/button.tsx";
import { EmptyState } from "../components/empty-state.tsx";
import { List, ListRow } from "../components/list.tsx";
import { Notice } from "../components/notice.tsx";
import { Page } from "../components/page.tsx";
import { PictureRibbon } from "../components/picture-ribbon.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { StreetScene } from "../components/street-scene.tsx";
import { TextField } from "../components/text-field.tsx";
import { programmeQuery } from "../features/lineup/programme/api.ts";
import { buildMonths } from "../features/lineup/programme/month.ts";
import { MonthPage } from "../features/lineup/programme/month-page.tsx";
import { NightList } from "../features/lineup/programme/night-list.tsx";
import { findOnNow, searchShows } from "../features/lineup/programme/on-now.ts";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { presentDate } from "../lib/zoned-time.ts";

export function loader() {
  void queryClient.prefetchQuery(programmeQuery);
  return null;
}

/** What families see: tonight's shows, any other night, and when theirs is on. */
export function Component() {
  const programme = useQuery(programmeQuery);
  const [search] = useSearchParams();
  const now = useNow();
  const { data } = programme;
  const night = search.get("night") ?? data?.tonight ?? "";
  const isTonight = data !== undefined && night === data.tonight;
  const shows = data?.shows.filter((show) => show.date === night) ?? [];
  const closedReason = data?.nights.find((each) => each.date === night)?.closedReason ?? null;
  const title = isTonight || !data ? "Tonight on the square" : `${presentDate(night, "full")} on the square`;
  const hours = shows.length > 0 ? ` · from ${shows[0]?.startsAt}` : "";

  return (
    <Page title={title} layout="full">
      <div className="relative on-dusk overflow-hidden bg-dusk print:hidden">
        <StreetScene className="absolute inset-0" fronts={14} />
        <div className="relative mx-auto max-w-public px-6 pt-8 pb-56 max-wide:px-4 max-wide:pb-36">
          <h1 tabIndex={-1}>{title}</h1>
          {data && (
            <p className="mt-1">
              {presentDate(night, "full")}
              {hours} · {data.eventName}, {data.townName}
            </p>
          )}
        </div>
      </div>
      <div className="mx-auto grid w-full max-w-public grid-cols-[1fr_22rem] gap-10 px-6 pt-6 pb-12 max-wide:grid-cols-1 max-wide:px-4 print:block">
        <section aria-labelledby="night" className="min-w-0">
          <div className="mb-2 flex items-center gap-3">
            <h2 id="night">{shows.length === 1 ? "One show" : `${shows.length === 0 ? "No" : shows.length} shows`}</h2>
            {shows.length > 0 && (
              <Button className="ml-auto print:hidden" icon="print" onPress={() => window.print()}>
                Print
              </Button>
            )}
          </div>
          <QueryView
            query={programme}
            errorTitle="The programme could not be loaded."
            skeleton={
              <SkeletonGroup label="Loading the programme" className="space-y-6 pt-3">
                <Skeleton shape="ribbon" />
                <Skeleton shape="ribbon" />
                <Skeleton shape="ribbon" />
              </SkeletonGroup>
            }
          >
            {({ publishedAt, timeZone }) =>
              shows.length > 0 ? (
                <NightList shows={shows} nowSlotId={findOnNow(shows, now, timeZone)} />
              ) : (
                <EmptyState
                  title={
                    closedReason ??
                    (publishedAt === null ? "Nothing is published yet" : "The square stays dark this night")
                  }
                  icon="moon"
                >
                  {publishedAt === null
                    ? "When the lineup is published, every show stands here with its time."
                    : "Pick another night in the calendar."}
                </EmptyState>
              )
            }
          </QueryView>
        </section>
        <div className="space-y-8 print:hidden">
          {data && <FindOurs shows={data.shows} />}
          {data && data.nights.length > 0 && (
            <section aria-label="All nights">
              {buildMonths(data.nights, data.shows).map((month) => (
                <MonthPage
                  key={month.name}
                  month={month}
                  chosen={night}
                  hrefOf={(date) => `/programme?night=${date}`}
                />
              ))}
              <p className="mt-1 text-meta text-soft">
                Each lit window is one show. Dark nights are for market, rest and holidays.
              </p>
            </section>
          )}
          <section aria-labelledby="good-to-know">
            <h2 id="good-to-know" className="mb-2">
              Good to know
            </h2>
            <Notice tone="warn" title="Light that changes quickly">
              Every show is checked by calculation against three flashes a second. A calculation can not promise that a
              place is safe for everybody: if flashing light can harm you, ask the stewards for the calmest spot. The
              venue’s safety officer decides.
            </Notice>
          </section>
        </div>
      </div>
    </Page>
  );
}

function FindOurs({ shows }: { shows: Parameters<typeof searchShows>[0] }) {
  const [text, setText] = useState("");
  const found = searchShows(shows, text);
  return (
    <section aria-labelledby="find-ours">
      <h2 id="find-ours" className="mb-2">
        When is ours on?
      </h2>
      <TextField
        label="Title, class or school"
        isLabelHidden
        placeholder="Title, or class such as 7B"
        type="search"
        value={text}
        onChange={(event) => setText(event.target.value)}
        hint="First names appear only where a family has agreed."
      />
      <div aria-live="polite" className="mt-2">
        {text.trim() !== "" && found.length === 0 && <p>No show fits “{text}”. Try one word of its title.</p>}
        {found.length > 0 && (
          <List>
            {found.slice(0, 8).map((show) => (
              <ListRow
                key={show.slotId}
                title={<Link to={`/programme?night=${show.date}`}>{show.title}</Link>}
                line={`${presentDate(show.date, "full")}, ${show.startsAt} · ${show.publicName}`}
                ribbon={<PictureRibbon picture={show.ribbon} size="row" label="" />}
              />
            ))}
          </List>
        )}
      </div>
    </section>
  );
}
