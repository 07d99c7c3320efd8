import { useMemo } from "react";
import type { RibbonPicture } from "../../shared/contracts/common.ts";
import { decodeBase64 } from "../lib/decode-base64.ts";
import { Ribbon, type RibbonProps } from "./ribbon.tsx";

export interface PictureRibbonProps extends Omit<RibbonProps, "ribbon"> {
  /** As the API gives it; null draws the bare weave. */
  picture: RibbonPicture | null;
}

/** A ribbon from the picture that comes with a show, a queue row or a slot. */
export function PictureRibbon({ picture, ...ribbon }: PictureRibbonProps) {
  const cells = useMemo(() => picture && { rows: picture.rows, columns: picture.columns, cells: decodeBase64(picture.cells) }, [picture]);
  return <Ribbon {...ribbon} ribbon={cells} />;
}
