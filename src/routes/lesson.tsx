import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { lazy, Suspense, useCallback, useEffect, useRef, useState } from "react";
import { useParams, useSearchParams, type LoaderFunctionArgs } from "react-router";
import type { CheckResult, LessonStep } from "../../shared/contracts/course.ts";
import type { RunOutcome } from "../../sandbox/engine/model.ts";
import { Page } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { lessonQuery, type LessonDetail, useAnswerStep, useAttemptStep } from "../features/course/api.ts";
import { CheckList } from "../features/course/components/check-list.tsx";
import { LessonFrame } from "../features/course/components/lesson-frame.tsx";
import { LessonText } from "../features/course/components/lesson-text.tsx";
import { StepQuestion } from "../features/course/components/step-question.tsx";
import { TeacherNotes } from "../features/course/components/teacher-notes.tsx";
import { findStepIndex } from "../features/course/model/progress.ts";
import { ShowRunner } from "../features/shows/show-runner.ts";
import type { BenchHandle } from "../features/shows/workbench/script-bench.tsx";
import { songQuery } from "../features/songs/api.ts";
import { layoutQuery } from "../features/square/api.ts";
import { Notice } from "../components/notice.tsx";
import { useDisposable } from "../hooks/use-disposable.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

/** The editor, the stage and the sound come after the text of the lesson. */
const ScriptBench = lazy(async () => ({
  default: (await import("../features/shows/workbench/script-bench.tsx")).ScriptBench,
}));

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "student", "teacher");
  void queryClient.prefetchQuery(lessonQuery(params["lessonId"] ?? ""));
  return null;
}

/** One lesson: its steps with text, question, checks, and a small studio. */
export function Component() {
  const { lessonId = "" } = useParams();
  return (
    <QueryView
      query={useQuery(lessonQuery(lessonId))}
      errorTitle="The lesson could not be loaded."
      skeleton={<LessonSkeleton />}
      frame={(message) => (
        <Page title="Lesson">
          <h1 className="mb-4">Lesson</h1>
          {message}
        </Page>
      )}
    >
      {(detail) => <LessonStepPage detail={detail} />}
    </QueryView>
  );
}

function LessonStepPage({ detail }: { detail: LessonDetail }) {
  const [search] = useSearchParams();
  const here = findStepIndex(detail.lesson, search.get("step"));
  const step = detail.steps[here];
  if (!step) throw new Response(null, { status: 404 });
  return <StepPage key={`${detail.lesson.id}/${step.id}`} detail={detail} step={step} here={here} />;
}

function StepPage({ detail, step, here }: { detail: LessonDetail; step: LessonStep; here: number }) {
  const { lesson } = detail;
  const key = { lessonId: lesson.id, stepId: step.id };
  const { data: session } = useSuspenseQuery(sessionQuery);
  const isTeacher = !(session?.user.roles.includes("student") ?? false);
  const progress = detail.progress.find((each) => each.stepId === step.id);
  const answer = useAnswerStep(key);
  const attempt = useAttemptStep(key);
  const bench = useRef<BenchHandle | null>(null);
  const [results, setResults] = useState<readonly CheckResult[] | null>(null);

  const handleCheck = () => {
    const source = bench.current?.source();
    if (source !== undefined) attempt.mutate(source, { onSuccess: (made) => setResults(made.results) });
  };

  return (
    <LessonFrame
      lesson={lesson}
      here={here}
      workbench={
        step.starter === null ? null : (
          <Workbench
            detail={detail}
            step={step}
            source={progress?.source ?? step.starter}
            onReady={(handle) => (bench.current = handle)}
          />
        )
      }
    >
      <h1 tabIndex={-1} className="text-6">
        {step.title}
      </h1>
      <LessonText paragraphs={step.text} />
      {step.question && (
        <StepQuestion
          question={step.question}
          answer={answer.data?.progress.answer ?? progress?.answer ?? null}
          onAnswer={(choice) => {
            if (!isTeacher) answer.mutate(choice);
          }}
          error={answer.error?.message ?? null}
        />
      )}
      {step.checks.length > 0 && (
        <CheckList
          checks={step.checks}
          results={results}
          isChecking={attempt.isPending}
          onCheck={handleCheck}
          disabledReason={isTeacher ? "Only students hand exercises to the check." : null}
          onShowMoment={(tick) => bench.current?.showMoment(tick)}
          onShowLine={(line) => bench.current?.showLine(line)}
        />
      )}
      {attempt.error && (
        <Notice tone="warn" role="alert" title="The check could not be made.">
          {attempt.error.message} Your script is still here; try again.
        </Notice>
      )}
      {isTeacher && <TeacherNotes notes={detail.teacherNotes} />}
    </LessonFrame>
  );
}

interface WorkbenchProps {
  detail: LessonDetail;
  step: LessonStep;
  source: string;
  onReady: (handle: BenchHandle) => void;
}

/** Loads the song and the square, then the small studio. */
function Workbench({ detail, step, source, onReady }: WorkbenchProps) {
  const song = useQuery(songQuery(detail.songId));
  const layout = useQuery(layoutQuery(detail.layoutId));
  return (
    <QueryView query={layout} errorTitle="The square could not be loaded." skeleton={<BenchSkeleton />}>
      {(square) => (
        <QueryView query={song} errorTitle="The song could not be loaded." skeleton={<BenchSkeleton />}>
          {({ beatMap, score }) => (
            <LoadedBench
              detail={detail}
              step={step}
              source={source}
              onReady={onReady}
              layout={square.layout}
              beatMap={beatMap}
              score={score}
            />
          )}
        </QueryView>
      )}
    </QueryView>
  );
}

type LoadedBenchProps = WorkbenchProps & {
  layout: Parameters<typeof ScriptBench>[0]["layout"];
  beatMap: Parameters<typeof ScriptBench>[0]["song"];
  score: Parameters<typeof ScriptBench>[0]["score"];
};

function LoadedBench({ detail, step, source, onReady, layout, beatMap, score }: LoadedBenchProps) {
  const setting = { songId: detail.songId, song: beatMap, layout, seed: detail.seed };
  const runner = useDisposable(() => new ShowRunner(setting), [detail.songId, beatMap, layout, detail.seed]);
  const [aim, setAim] = useState<RunOutcome | null>(null);
  const [start, setStart] = useState({ source, count: 0 });
  const handleReady = useCallback((handle: BenchHandle) => onReady(handle), [onReady]);

  useEffect(() => {
    if (step.aim === null) return;
    const aimRunner = new ShowRunner(setting);
    void aimRunner.runScript(step.aim).then(setAim, () => undefined);
    return () => aimRunner.dispose();
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the aim belongs to the step alone
  }, [step.id]);

  if (!runner) return <BenchSkeleton />;
  const { starter } = step;
  return (
    <Suspense fallback={<BenchSkeleton />}>
      <ScriptBench
        key={start.count}
        layout={layout}
        song={beatMap}
        score={score}
        source={start.source}
        runScript={runner.runScript}
        checkShow={runner.checkShow}
        onChange={() => undefined}
        aim={aim}
        onStartOver={starter === null ? null : () => setStart(({ count }) => ({ source: starter, count: count + 1 }))}
        onReady={handleReady}
        status={null}
      />
    </Suspense>
  );
}

function BenchSkeleton() {
  return (
    <SkeletonGroup label="Loading the square" className="space-y-3">
      <Skeleton shape="ribbon" className="h-80" />
      <Skeleton shape="block" className="h-72" />
    </SkeletonGroup>
  );
}

function LessonSkeleton() {
  return (
    <Page title="Loading">
      <h1 className="sr-only">Loading the lesson</h1>
      <SkeletonGroup label="Loading the lesson" className="space-y-4">
        <Skeleton className="h-8 w-1/2" />
        <Skeleton shape="block" className="h-64" />
      </SkeletonGroup>
    </Page>
  );
}
