import { useEffect, useRef, useState } from "react";
import { IconButton } from "../../../components/icon-button.tsx";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { useMediaQuery } from "../../../hooks/use-media-query.ts";
import "../editor/editor.css";
import "./compare.css";
import { ScriptCompare, type ComparedText } from "./script-compare.ts";

export interface ScriptCompareViewProps {
  earlier: ComparedText;
  later: ComparedText;
  /** Given: the later text can be changed and takes places of the earlier one over; it is told here. */
  onMerge?: (source: string) => void;
}

/** Two scripts side by side, on a narrow screen one under the other, with what differs marked. */
export function ScriptCompareView({ earlier, later, onMerge }: ScriptCompareViewProps) {
  const hostRef = useRef<HTMLDivElement>(null);
  const isStacked = useMediaQuery("(max-width: 767px)");
  const [places, setPlaces] = useState(0);
  const told = useRef(onMerge);
  useEffect(() => {
    told.current = onMerge;
  });
  const isMerge = onMerge !== undefined;
  const compare = useDisposable(() => {
    if (!hostRef.current) throw new Error("The two scripts have no place on the page.");
    return new ScriptCompare({
      parent: hostRef.current,
      earlier,
      later,
      isMerge,
      isStacked,
      onChange: (source, count) => {
        setPlaces(count);
        told.current?.(source);
      },
    });
  }, [earlier.source, earlier.name, later.source, later.name, isMerge, isStacked]);
  return (
    <div className="compare">
      <div className="compare-head">
        {isStacked ? (
          <p>
            <span className="compare-sign is-earlier">− {earlier.name}</span>{" "}
            <span className="compare-sign is-later">+ {later.name}</span>
          </p>
        ) : (
          <>
            <p className="compare-sign is-earlier">− {earlier.name}</p>
            <p className="compare-sign is-later">+ {later.name}</p>
          </>
        )}
        <div className="compare-places">
          <span role="status">{presentPlaces(places)}</span>
          <IconButton
            icon="chevron-up"
            label="To the difference before"
            size="small"
            disabledReason={places === 0 ? "Nothing differs." : null}
            onPress={() => compare?.goToPlace(-1)}
          />
          <IconButton
            icon="chevron-down"
            label="To the next difference"
            size="small"
            disabledReason={places === 0 ? "Nothing differs." : null}
            onPress={() => compare?.goToPlace(1)}
          />
        </div>
      </div>
      <div ref={hostRef} className="compare-texts script-editor" />
    </div>
  );
}

function presentPlaces(places: number): string {
  if (places === 0) return "Both are the same.";
  return places === 1 ? "1 place differs." : `${places} places differ.`;
}
