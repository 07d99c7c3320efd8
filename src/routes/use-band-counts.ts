import { useQuery } from "@tanstack/react-query";
import type { SignedInUser } from "../../shared/contracts/auth.ts";
import { forwardsQuery } from "../features/lineup/api.ts";
import { inboxQuery } from "../features/marking/api.ts";
import type { BandCounts } from "./navigation.ts";

/** What waits behind the band's links, for the roles of the person; 0 until it is known. */
export function useBandCounts(user: SignedInUser | null): BandCounts {
  const inbox = useQuery({ ...inboxQuery, enabled: user?.roles.includes("teacher") ?? false });
  const forwards = useQuery({ ...forwardsQuery, enabled: user?.roles.includes("coordinator") ?? false });
  return {
    "/marking": {
      count: inbox.data?.reduce((sum, assignment) => sum + assignment.toMark, 0) ?? 0,
      countLabel: "to mark",
    },
    "/event/shows": {
      count: forwards.data?.filter((forward) => forward.state === "waiting").length ?? 0,
      countLabel: "waiting",
    },
  };
}
