import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointResponse } from "../../../shared/contract.ts";
import { courseContract } from "../../../shared/contracts/course.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall } from "../../lib/offline-shelf.ts";

export const lessonsQuery = queryOptions({
  queryKey: ["course", "lessons"],
  queryFn: async ({ signal }) =>
    (await askOrRecall("lessons", () => callApi(courseContract.lessons, {}, signal))).lessons,
});

export type LessonDetail = EndpointResponse<typeof courseContract.lesson>;

export const lessonQuery = (lessonId: string) =>
  queryOptions({
    queryKey: ["course", "lesson", lessonId],
    queryFn: ({ signal }) =>
      askOrRecall(`lesson/${lessonId}`, () => callApi(courseContract.lesson, { params: { lessonId } }, signal)),
  });

export interface StepKey {
  readonly lessonId: string;
  readonly stepId: string;
}

export function useAnswerStep({ lessonId, stepId }: StepKey) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (choice: number) => callApi(courseContract.answer, { params: { lessonId, stepId }, body: { choice } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["course"] }),
  });
}

export function useAttemptStep({ lessonId, stepId }: StepKey) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (source: string) => callApi(courseContract.attempt, { params: { lessonId, stepId }, body: { source } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["course"] }),
  });
}
