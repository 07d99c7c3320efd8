import { useQuery } from "@tanstack/react-query";
import type { LoaderFunctionArgs } from "react-router";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { classesQuery } from "../features/classes/api.ts";
import { ClassList, ClassListSkeleton } from "../features/classes/components/class-list.tsx";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  void queryClient.prefetchQuery(classesQuery);
  return null;
}

/** The classes of a teacher. */
export function Component() {
  const classes = useQuery(classesQuery);
  return (
    <Page title="Classes" density="staff" className="mx-auto max-w-page">
      <PageHeader title="Classes" />
      <QueryView query={classes} skeleton={<ClassListSkeleton />} errorTitle="Your classes could not be loaded.">
        {(list) => <ClassList classes={list} />}
      </QueryView>
    </Page>
  );
}
