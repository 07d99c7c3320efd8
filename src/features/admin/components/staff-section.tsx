import { useState } from "react";
import type { StaffRow } from "../../../../shared/contracts/admin.ts";
import { Button } from "../../../components/button.tsx";
import { Card, CardHeader } from "../../../components/card.tsx";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { Tag } from "../../../components/tag.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { useSetDisabled } from "../api.ts";
import { AddStaffDialog, type SchoolChoice } from "./add-staff-dialog.tsx";

export interface StaffSectionProps {
  staff: readonly StaffRow[];
  schools: readonly SchoolChoice[];
  /** The admin who is signed in: nobody locks themselves out. */
  ownId: string;
  timeZone: string;
  now: number;
}

/** Staff accounts: add one, disable one, let one in again. */
export function StaffSection({ staff, schools, ownId, timeZone, now }: StaffSectionProps) {
  const [isAdding, setIsAdding] = useState(false);
  const [disabling, setDisabling] = useState<StaffRow | null>(null);
  const setDisabled = useSetDisabled();
  const change = (row: StaffRow, isDisabled: boolean) =>
    setDisabled.mutate(
      { userId: row.id, isDisabled },
      {
        onSuccess: () => {
          setDisabling(null);
          if (isDisabled)
            showToast({
              title: `${row.displayName} can no longer sign in.`,
              action: { label: "Undo", onPress: () => change(row, false) },
            });
          else showToast({ title: `${row.displayName} can sign in again.` });
        },
        onError: (error) => {
          if (!isDisabled)
            showToast({ tone: "stop", title: `${row.displayName} was not let in again.`, detail: error.message });
        },
      },
    );

  return (
    <Card as="section" aria-labelledby="staff-heading">
      <CardHeader
        title="Staff"
        titleId="staff-heading"
        detail={staff.length}
        actions={
          <Button icon="plus" size="small" onPress={() => setIsAdding(true)}>
            Add a staff account
          </Button>
        }
      />
      <div className="relative">
        <table className="w-full border-collapse max-wide:block">
          <thead className="max-wide:sr-only">
            <tr className="border-b-[1.5px] border-line text-left text-meta text-slate [&>th]:px-4 [&>th]:py-2 [&>th]:font-semibold">
              <th scope="col">Name</th>
              <th scope="col">E-mail</th>
              <th scope="col">Roles</th>
              <th scope="col">School</th>
              <th scope="col">Last seen</th>
              <th scope="col">
                <span className="sr-only">Acts</span>
              </th>
            </tr>
          </thead>
          <tbody className="divide-y divide-line max-wide:block">
            {staff.map((row) => (
              <tr
                key={row.id}
                className="max-wide:relative max-wide:flex max-wide:flex-wrap max-wide:items-center max-wide:gap-x-4 max-wide:gap-y-1 max-wide:px-4 max-wide:py-3 wide:[&>*]:px-4 wide:[&>*]:py-1.5"
              >
                <th
                  scope="row"
                  className="text-left font-[650] whitespace-nowrap max-wide:w-full max-wide:pr-36 max-wide:leading-9"
                >
                  {row.displayName}{" "}
                  {row.isDisabled && (
                    <Tag state="plain" icon="lock">
                      Disabled
                    </Tag>
                  )}
                </th>
                <td className="font-mono text-meta max-wide:w-full">{row.email}</td>
                <td>{row.roles.join(", ")}</td>
                <td className="whitespace-nowrap">{row.schoolName ?? "the event"}</td>
                <td className="whitespace-nowrap text-slate">
                  {row.lastSeenAt === null ? "never" : presentWhen(row.lastSeenAt, now, timeZone)}
                </td>
                <td className="text-right max-wide:absolute max-wide:top-2 max-wide:right-3">
                  {row.isDisabled ? (
                    <Button
                      size="small"
                      icon="unlock"
                      onPress={() => change(row, false)}
                      aria-label={`Let ${row.displayName} in again`}
                    >
                      Let in again
                    </Button>
                  ) : (
                    <Button
                      size="small"
                      icon="lock"
                      onPress={() => setDisabling(row)}
                      disabledReason={row.id === ownId ? "This is your own account." : null}
                      aria-label={`Disable ${row.displayName}`}
                    >
                      Disable
                    </Button>
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {isAdding && <AddStaffDialog schools={schools} onClose={() => setIsAdding(false)} />}
      <ConfirmDialog
        isOpen={disabling !== null}
        title={`Disable ${disabling?.displayName ?? ""}?`}
        confirmLabel="Disable the account"
        cancelLabel="Keep it"
        isPending={setDisabled.isPending}
        error={setDisabled.error?.message ?? null}
        onCancel={() => {
          setDisabled.reset();
          setDisabling(null);
        }}
        onConfirm={() => disabling && change(disabling, true)}
      >
        <p>
          Every open session of this account ends at once and nobody can sign in with it. Classes, marks and shows stay.
          You can let the person in again at any time.
        </p>
      </ConfirmDialog>
    </Card>
  );
}
