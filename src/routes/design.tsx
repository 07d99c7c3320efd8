import { useSearchParams } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { RadioRow } from "../components/radio-row.tsx";
import { Colours } from "./design/colours.tsx";
import { Controls } from "./design/controls.tsx";
import { Fields } from "./design/fields.tsx";
import { Pictures } from "./design/pictures.tsx";
import { States } from "./design/states.tsx";

const DENSITIES = [
  { value: "student", label: "student" },
  { value: "staff", label: "staff" },
] as const;

/** Every part of the design system in its states: for people who build pages, for screenshots and for the accessibility check. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const density = search.get("density") === "staff" ? "staff" : "student";
  return (
    <Page title="Design" density={density} layout="column">
      <PageHeader
        title="Design"
        lead="Every part in its states. The theme switch is in the band."
        actions={
          <RadioRow
            legend="Density"
            isLegendHidden
            options={[...DENSITIES]}
            value={density}
            onChange={(value) => setSearch({ density: value }, { replace: true })}
            className="w-56"
          />
        }
      />
      <Pictures />
      <Controls />
      <Fields />
      <States />
      <Colours />
    </Page>
  );
}
