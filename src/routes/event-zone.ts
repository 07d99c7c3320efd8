import { useQuery } from "@tanstack/react-query";
import { programmeQuery } from "../features/lineup/programme/api.ts";

/** The event's time zone, in which its schools live too; the computer's own until it is known. */
export function useEventZone(): string {
  const { data } = useQuery(programmeQuery);
  return data?.timeZone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
}
