import { type QueryClient, queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { classesContract, type SignInCard } from "../../../shared/contracts/classes.ts";
import type { ClassId, UserId } from "../../../shared/ids.ts";
import { callApi } from "../../lib/api-client.ts";

/** The classes that the teacher teaches. */
export const classesQuery = queryOptions({
  queryKey: ["classes", "list"],
  queryFn: async ({ signal }) => (await callApi(classesContract.list, {}, signal)).classes,
});

export const classQuery = (classId: ClassId) =>
  queryOptions({
    queryKey: ["classes", "one", classId],
    queryFn: ({ signal }) => callApi(classesContract.get, { params: { classId } }, signal),
  });

/** Cards made in this visit, kept in memory alone until they are closed: their words can not be read again. */
const madeCardsQuery = (classId: ClassId) =>
  queryOptions({
    queryKey: ["classes", "made-cards", classId],
    queryFn: (): readonly SignInCard[] => [],
    initialData: [],
    staleTime: Infinity,
    gcTime: Infinity,
  });

/** The cards to print, and the way to forget them. */
export function useMadeCards(classId: ClassId): readonly [cards: readonly SignInCard[], drop: () => void] {
  const client = useQueryClient();
  const { data } = useQuery(madeCardsQuery(classId));
  return [data, () => client.setQueryData(madeCardsQuery(classId).queryKey, [])];
}

export function useAddStudents(classId: ClassId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (displayNames: string[]) =>
      callApi(classesContract.addStudents, { params: { classId }, body: { displayNames } }),
    onSuccess: ({ cards }) => {
      client.setQueryData(madeCardsQuery(classId).queryKey, cards);
      return forgetClass(client, classId);
    },
  });
}

/** New words for these students; the answer is the only time that they are readable. */
export function useMakeCards(classId: ClassId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (studentIds: UserId[]) =>
      callApi(classesContract.makeCards, { params: { classId }, body: { studentIds } }),
    onSuccess: ({ cards }) => client.setQueryData(madeCardsQuery(classId).queryKey, cards),
  });
}

export function useResetSignIn(classId: ClassId) {
  return useMutation({
    mutationFn: (studentId: UserId) => callApi(classesContract.resetSignIn, { params: { classId, studentId } }),
  });
}

export function useRemoveStudent(classId: ClassId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (studentId: UserId) => callApi(classesContract.removeStudent, { params: { classId, studentId } }),
    onSuccess: () => forgetClass(client, classId),
  });
}

/** A class and the list it is in are old now; the made cards are not. */
function forgetClass(client: QueryClient, classId: ClassId): Promise<unknown> {
  return Promise.all([
    client.invalidateQueries({ queryKey: classesQuery.queryKey }),
    client.invalidateQueries({ queryKey: classQuery(classId).queryKey }),
  ]);
}
