import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointCall, EndpointResponse } from "../../../shared/contract.ts";
import { adminContract } from "../../../shared/contracts/admin.ts";
import type { UserId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";

export type AdminOverview = EndpointResponse<typeof adminContract.overview>;

/** Schools, staff and the state of the database. */
export const overviewQuery = queryOptions({
  queryKey: ["admin", "overview"],
  queryFn: ({ signal }) => callApi(adminContract.overview, {}, signal),
});

/** The audit log in pages, newest first; a page begins before the last row of the one above it. */
export const auditQuery = infiniteQueryOptions({
  queryKey: ["admin", "audit"],
  queryFn: ({ pageParam, signal }) => callApi(adminContract.audit, { query: { before: pageParam } }, signal),
  initialPageParam: undefined as number | undefined,
  getNextPageParam: (page) => (page.hasMore ? page.rows.at(-1)?.id : undefined),
});

export type NewStaff = EndpointCall<typeof adminContract.addStaff>["body"];

export function useAddStaff() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: NewStaff) => callApi(adminContract.addStaff, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["admin"] }),
  });
}

export function useSetDisabled() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId, isDisabled }: { userId: UserId; isDisabled: boolean }) =>
      callApi(adminContract.setDisabled, { params: { userId }, body: { isDisabled } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["admin"] }),
  });
}
