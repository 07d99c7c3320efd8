import { useQueryClient } from "@tanstack/react-query";
import { useNavigate } from "react-router";
import type { Session } from "../../../../shared/contracts/auth.ts";
import { Dialog } from "../../../components/dialog.tsx";
import { homeOf } from "../model/home-of.ts";
import { StaffSignInForm } from "./staff-sign-in-form.tsx";
import { StudentSignInForm } from "./student-sign-in-form.tsx";

export interface SignInAgainProps {
  /** The session that ended. */
  session: Session;
  onDone: () => void;
}

/** Over the page when its session has ended: signing in goes on where one was, with everything typed still there. */
export function SignInAgain({ session, onDone }: SignInAgainProps) {
  const client = useQueryClient();
  const navigate = useNavigate();

  const handleSignedIn = (next: Session) => {
    onDone();
    if (next.user.id === session.user.id) void client.invalidateQueries();
    else void navigate(homeOf(next.user.roles));
  };

  const isStudent = session.user.roles.includes("student");
  return (
    <Dialog
      isOpen
      onClose={() => {
        onDone();
        void navigate("/sign-in");
      }}
      role="alertdialog"
      title={`Please sign in again, ${session.user.displayName}`}
    >
      <p>Your time here was over. What you wrote is still on this computer and is saved when you are back.</p>
      {isStudent ? <StudentSignInForm onSignedIn={handleSignedIn} /> : <StaffSignInForm onSignedIn={handleSignedIn} />}
    </Dialog>
  );
}
