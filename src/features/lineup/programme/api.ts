import { queryOptions } from "@tanstack/react-query";
import { lineupContract } from "../../../../shared/contracts/lineup.ts";
import { callApi } from "../../../lib/api-client.ts";

/** The published programme; it changes at night and at a publication. */
export const programmeQuery = queryOptions({
  queryKey: ["lineup", "programme"],
  queryFn: ({ signal }) => callApi(lineupContract.programme, {}, signal),
  staleTime: 60_000,
});
