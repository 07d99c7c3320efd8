import { queryOptions } from "@tanstack/react-query";
import { squareContract } from "../../../shared/contracts/square.ts";
import type { LayoutId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall } from "../../lib/offline-shelf.ts";

/** A numbered layout never changes. */
/** The layout that drafts follow now. */
export const currentSquareQuery = queryOptions({
  queryKey: ["square", "current"],
  queryFn: ({ signal }) => callApi(squareContract.current, {}, signal),
});

export const layoutQuery = (layoutId: LayoutId) =>
  queryOptions({
    queryKey: ["square", "layout", layoutId],
    queryFn: ({ signal }) =>
      askOrRecall(`layout/${layoutId}`, () => callApi(squareContract.layout, { params: { layoutId } }, signal)),
    staleTime: Infinity,
  });
