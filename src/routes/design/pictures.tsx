import { DateLeaf } from "../../components/date-leaf.tsx";
import { LinkButton } from "../../components/link-button.tsx";
import { List, ListRow } from "../../components/list.tsx";
import { ProgressSteps } from "../../components/progress-steps.tsx";
import { Ribbon, type RibbonSize } from "../../components/ribbon.tsx";
import { ShowCard } from "../../components/show-card.tsx";
import { Skeleton, SkeletonGroup } from "../../components/skeleton.tsx";
import { StepRail } from "../../components/step-rail.tsx";
import { StreetScene } from "../../components/street-scene.tsx";
import { Tag } from "../../components/tag.tsx";
import { GallerySection } from "./gallery-section.tsx";
import { SAMPLE_RIBBONS } from "./sample-ribbons.ts";

const SIZES: RibbonSize[] = ["queue", "row", "strip", "card", "marking", "reading"];

/** Ribbons, street, cards and rows. */
export function Pictures() {
  return (
    <>
      <GallerySection title="Next thing">
        <div className="grid grid-cols-[1fr_1.15fr] dusk-sheet max-wide:grid-cols-1">
          <div className="flex flex-col items-start justify-center gap-2 px-7 py-6 max-wide:order-2 max-wide:px-4.5">
            <p className="text-on-dusk-soft">Next thing to do</p>
            <h3 className="text-[1.6875rem]">Taking turns</h3>
            <p className="text-on-dusk-soft">
              Lesson 5 · you are on step 3 of 5, <em>investigate</em>
            </p>
            <ProgressSteps total={5} done={2} label="Step 3 of 5" className="mt-1.5" />
            <LinkButton to="/design" look="lamp" icon="play" className="mt-3 max-wide:self-stretch">
              Carry on
            </LinkButton>
          </div>
          <StreetScene fronts={9} seed={12} className="h-60 max-wide:order-1 max-wide:h-32" />
        </div>
      </GallerySection>
      <GallerySection title="Ribbons">
        {SIZES.map((size) => (
          <div key={size}>
            <p className="mb-1 text-meta text-slate">{size}</p>
            <Ribbon
              ribbon={SAMPLE_RIBBONS.foxes}
              label={`Nine Foxes, size ${size}`}
              size={size}
              isSquare={size === "marking"}
              now={size === "reading" ? 0.64 : null}
            />
          </div>
        ))}
      </GallerySection>
      <GallerySection title="Show cards">
        <ul className="grid grid-cols-[repeat(auto-fill,minmax(15rem,1fr))] gap-4 max-wide:grid-cols-2 max-wide:gap-3">
          <li>
            <ShowCard
              ribbon={<Ribbon ribbon={SAMPLE_RIBBONS.foxes} label="" />}
              title="Nine Foxes"
              to="/design"
              line="with Idris · 2:24"
              tag={<Tag state="scheduled">On the square</Tag>}
            />
          </li>
          <li>
            <ShowCard
              ribbon={<Ribbon ribbon={SAMPLE_RIBBONS.suns} label="" />}
              title="Ten Small Suns"
              to="/design"
              line="saved 4 minutes ago"
              tag={<Tag state="working" />}
            />
          </li>
          <li>
            <ShowCard
              ribbon={<Ribbon ribbon={SAMPLE_RIBBONS.rain} label="" />}
              title="Rain on the Baths"
              to="/design"
              line="my own idea · 1:52"
            />
          </li>
          <li>
            <SkeletonGroup
              label="Loading a show"
              className="h-full rounded-sheet border border-line bg-card p-2.5 shadow-sheet-1"
            >
              <Skeleton shape="ribbon" />
              <Skeleton className="mt-4 ml-1 w-2/3" />
              <Skeleton className="mt-3 ml-1 w-1/2" />
            </SkeletonGroup>
          </li>
        </ul>
      </GallerySection>
      <GallerySection title="Rows">
        <List>
          <ListRow
            title="Twelve bars of calm"
            line="Back from Ms Marlow with 2 comments · again by Friday"
            tag={<Tag state="revise" />}
            actions={
              <LinkButton to="/design" size="small" look="main" aria-label="Read and fix: Twelve bars of calm">
                Read and fix
              </LinkButton>
            }
          />
          <ListRow
            title="One song, two moods"
            line="Handed in yesterday, 14:10"
            to="/design"
            isWholeRow
            tag={<Tag state="submitted" />}
          />
          <ListRow
            isHere
            title="Wren, Idris"
            line="yesterday"
            ribbon={<Ribbon ribbon={SAMPLE_RIBBONS.suns} label="" size="queue" />}
          />
          <ListRow
            lead={<DateLeaf dateTime="2026-12-11" weekday="Fri" day="11" label="Friday 11 December" />}
            title="Nine Foxes"
            line="18:20 · by Wren and Idris"
            ribbon={<Ribbon ribbon={SAMPLE_RIBBONS.rain} label="" size="row" />}
          />
        </List>
      </GallerySection>
      <GallerySection title="Steps">
        <div className="border-b border-line bg-card px-4">
          <StepRail
            label="Steps of Taking turns"
            steps={[
              { label: "Predict", state: "done", to: "/design" },
              { label: "Run", state: "done", to: "/design" },
              { label: "Investigate", state: "here", to: "/design" },
              { label: "Change", state: "later" },
              { label: "Make", state: "later" },
            ]}
          />
        </div>
      </GallerySection>
      <GallerySection title="Streets">
        <div className="grid grid-cols-3 gap-4 max-wide:grid-cols-1">
          <StreetScene fronts={5} seed={5} isTall className="h-96" />
          <StreetScene fronts={6} seed={9} lighting="one" className="h-44" />
          <StreetScene fronts={5} narrowFronts={5} seed={30} className="h-14" />
        </div>
      </GallerySection>
    </>
  );
}
