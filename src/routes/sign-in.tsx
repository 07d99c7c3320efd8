import { redirect, useNavigate, useSearchParams, type LoaderFunctionArgs } from "react-router";
import { Link } from "react-router";
import type { Session } from "../../shared/contracts/auth.ts";
import { Mark } from "../components/mark.tsx";
import { Page } from "../components/page.tsx";
import { StreetScene } from "../components/street-scene.tsx";
import { Tabs } from "../components/tabs.tsx";
import { ThemeToggle } from "../components/theme-toggle.tsx";
import { sessionQuery } from "../features/auth/api.ts";
import { NewWordsForm } from "../features/auth/components/new-words-form.tsx";
import { StaffSignInForm } from "../features/auth/components/staff-sign-in-form.tsx";
import { StudentSignInForm } from "../features/auth/components/student-sign-in-form.tsx";
import { nextPath } from "../features/auth/model/home-of.ts";
import { queryClient } from "../lib/query-client.ts";

/** Whoever is signed in already has nothing to do here. */
export async function loader({ request }: LoaderFunctionArgs) {
  const session = await queryClient.ensureQueryData(sessionQuery).catch(() => null);
  if (session !== null) throw redirect(nextPath(new URL(request.url).searchParams, session.user.roles));
  return null;
}

/** The door: a street at dusk on one side, the form on the other. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const handleSignedIn = (session: Session) => void navigate(nextPath(search, session.user.roles), { replace: true });
  const tab = search.get("as") ?? "student";

  return (
    <Page title="Sign in" layout="full" className="grid grid-cols-[56fr_44fr] max-wide:block">
      <div className="relative on-dusk min-h-dvh overflow-hidden bg-dusk max-wide:min-h-0">
        <StreetScene isTall fronts={8} narrowFronts={6} className="absolute inset-0" />
        <div className="relative p-10 max-wide:p-5 max-wide:pb-28">
          <p className="flex items-center gap-3 font-head text-5 font-bold">
            <Mark />
            Duskbell
          </p>
          <p className="mt-4 max-w-[12ch] font-head text-7 leading-[1.05] font-semibold text-balance max-wide:max-w-none max-wide:text-5">
            Write the lights for the town square.
          </p>
        </div>
      </div>
      <div className="pinked-left flex flex-col items-center justify-center px-6 py-10 max-wide:px-4 max-wide:py-6">
        <div className="w-full max-w-[27rem]">
          <div className="flex items-center justify-between">
            <h1 tabIndex={-1}>Sign in</h1>
            <ThemeToggle />
          </div>
          <Tabs
            className="mt-4"
            label="Who you are"
            selectedId={tab}
            onSelect={(as) => setSearch((before) => ({ ...Object.fromEntries(before), as }), { replace: true })}
            tabs={[
              {
                id: "student",
                label: "Student",
                icon: "book",
                content: <StudentSignInForm onSignedIn={handleSignedIn} />,
              },
              { id: "staff", label: "Staff", icon: "people", content: <StaffSignInForm onSignedIn={handleSignedIn} /> },
              {
                id: "code",
                label: "I have a code",
                icon: "key",
                content: <NewWordsForm onSignedIn={handleSignedIn} />,
              },
            ]}
          />
          {tab === "student" && (
            <p className="mt-6 text-slate">
              Words lost? Your teacher can give you a code or print you a new card. You do not need an e-mail address.
            </p>
          )}
          <p className="mt-6 border-t border-line pt-5 text-slate">
            Just here for the lights? <Link to="/programme">Tonight’s programme</Link>
          </p>
        </div>
      </div>
    </Page>
  );
}
