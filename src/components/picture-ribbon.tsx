import { useMemo } from "react";
import type { RibbonPicture } from "../../shared/contracts/common.ts";
import { decodeRibbon } from "../../sandbox/timeline/ribbon.ts";
import { Ribbon, type RibbonProps } from "./ribbon.tsx";

export interface PictureRibbonProps extends Omit<RibbonProps, "ribbon"> {
  /** As the API sends it; null draws the bare weave. */
  picture: RibbonPicture | null;
}

/** A ribbon from the API's packed picture. */
export function PictureRibbon({ picture, ...ribbon }: PictureRibbonProps) {
  const cells = useMemo(() => (picture === null ? null : decodeRibbon(picture)), [picture]);
  return <Ribbon ribbon={cells} {...ribbon} />;
}
