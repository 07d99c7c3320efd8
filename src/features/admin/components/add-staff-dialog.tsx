import { useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Checkbox } from "../../../components/checkbox.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Select } from "../../../components/select.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { findFieldError } from "../../../lib/field-error.ts";
import { useAddStaff } from "../api.ts";
import { checkStaffDraft, EMPTY_STAFF_DRAFT, STAFF_ROLES, type StaffDraft } from "../model/new-staff.ts";

export interface SchoolChoice {
  id: string;
  name: string;
}

export interface AddStaffDialogProps {
  schools: readonly SchoolChoice[];
  onClose: () => void;
}

/** A staff account with a first password, which the admin hands over in person. */
export function AddStaffDialog({ schools, onClose }: AddStaffDialogProps) {
  const [draft, setDraft] = useState<StaffDraft>(EMPTY_STAFF_DRAFT);
  const [isTried, setIsTried] = useState(false);
  const addStaff = useAddStaff();
  const checked = checkStaffDraft(draft);
  const errorOf = (field: string) =>
    isTried ? (checked.errors?.[field] ?? findFieldError(addStaff.error, `/${field}`)) : null;
  const set = (change: Partial<StaffDraft>) => setDraft((before) => ({ ...before, ...change }));
  const isGeneralError =
    addStaff.error !== null &&
    ["displayName", "email", "roles", "schoolId", "password"].every(
      (field) => findFieldError(addStaff.error, `/${field}`) === null,
    );

  const add = () => {
    setIsTried(true);
    if (!checked.body) return;
    addStaff.mutate(checked.body, {
      onSuccess: ({ staff }) => {
        showToast({ title: `${staff.displayName} is added.`, detail: "Hand the first password over in person." });
        onClose();
      },
    });
  };
  const rolesError = errorOf("roles");
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Add a staff account"
      isBusy={addStaff.isPending}
      actions={
        <>
          <Button onPress={onClose}>Cancel</Button>
          <Button look="main" icon="plus" onPress={add} isPending={addStaff.isPending}>
            Add the account
          </Button>
        </>
      }
    >
      <TextField
        label="Name"
        hint="As students and colleagues see it: Ms Marlow."
        autoFocus
        value={draft.displayName}
        maxLength={80}
        onChange={(event) => set({ displayName: event.target.value })}
        error={errorOf("displayName")}
      />
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="off"
        value={draft.email}
        onChange={(event) => set({ email: event.target.value })}
        error={errorOf("email")}
      />
      <fieldset aria-describedby={rolesError ? "roles-error" : undefined}>
        <legend className="mb-1.5 font-semibold">Roles</legend>
        <div className="flex flex-wrap gap-x-6">
          {STAFF_ROLES.map((role) => (
            <Checkbox
              key={role}
              label={role}
              checked={draft.roles.includes(role)}
              onChange={(event) =>
                set({
                  roles: event.target.checked ? [...draft.roles, role] : draft.roles.filter((one) => one !== role),
                })
              }
            />
          ))}
        </div>
        {rolesError && (
          <p id="roles-error" className="mt-1 font-semibold text-rowan">
            {rolesError}
          </p>
        )}
      </fieldset>
      <Select
        label="School"
        placeholder="No school: works for the event"
        value={draft.schoolId}
        onChange={(event) => set({ schoolId: event.target.value })}
        options={schools.map((school) => ({ value: school.id, label: school.name }))}
        error={errorOf("schoolId")}
      />
      <TextField
        label="First password"
        hint="At least 15 characters; a sentence works well. The person changes it after the first sign-in."
        type="text"
        autoComplete="off"
        isMono
        value={draft.password}
        maxLength={256}
        onChange={(event) => set({ password: event.target.value })}
        error={errorOf("password")}
      />
      {isGeneralError && (
        <Notice tone="stop" role="alert" title="The account was not added.">
          {addStaff.error?.message} What you typed is still here.
        </Notice>
      )}
    </Dialog>
  );
}
