import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { classesContract } from "../../../shared/contracts/classes.ts";
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

export function useAddStudents(classId: ClassId) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (displayNames: string[]) => callApi(classesContract.addStudents, { params: { classId }, body: { displayNames } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["classes"] }),
  });
}

/** New words for these students; the answer is the only time that they are readable. */
export function useMakeCards(classId: ClassId) {
  return useMutation({
    mutationFn: (studentIds: UserId[]) => callApi(classesContract.makeCards, { params: { classId }, body: { studentIds } }),
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
    onSuccess: () => client.invalidateQueries({ queryKey: ["classes"] }),
  });
}
