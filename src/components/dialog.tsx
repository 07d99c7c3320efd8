import type { ReactNode } from "react";
import { Dialog as DialogPanel } from "react-aria-components/Dialog";
import { Heading } from "react-aria-components/Heading";
import { Modal, ModalOverlay } from "react-aria-components/Modal";
import { joinClasses } from "./class-names.ts";
import { IconButton } from "./icon-button.tsx";

export interface DialogProps {
  isOpen: boolean;
  /** Escape, the cross, and a press outside. The focus goes back to where it was. */
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** Buttons at the foot, the main one last. */
  actions?: ReactNode;
  size?: "small" | "normal" | "wide" | "full";
  /** alertdialog: a question that must be answered; a press outside does not close it. */
  role?: "dialog" | "alertdialog";
  /** While work is under way nothing closes it. */
  isBusy?: boolean;
}

const SIZES = { small: "max-w-[28rem]", normal: "max-w-[36rem]", wide: "max-w-[56rem]", full: "max-w-[84rem]" };

/** A sheet over the page for one task. Keeps the focus inside, Escape closes; on a phone it comes from below. */
export function Dialog({
  isOpen,
  onClose,
  title,
  children,
  actions,
  size = "normal",
  role = "dialog",
  isBusy = false,
}: DialogProps) {
  return (
    <ModalOverlay
      isOpen={isOpen}
      onOpenChange={(open) => {
        if (!open && !isBusy) onClose();
      }}
      isDismissable={role === "dialog" && !isBusy}
      isKeyboardDismissDisabled={isBusy}
      className="fixed inset-0 z-40 flex h-(--visual-viewport-height) items-center justify-center bg-veil p-4 max-wide:items-end max-wide:p-0"
    >
      <Modal className={joinClasses("w-full", SIZES[size], "max-wide:max-w-none")}>
        <DialogPanel
          role={role}
          className="flex max-h-[calc(var(--visual-viewport-height)-2rem)] flex-col rounded-sheet border border-line bg-paper text-ink shadow-sheet-2 outline-none max-wide:rounded-b-none"
        >
          <div className="flex items-start gap-3 px-6 pt-5 pb-1 max-wide:px-4">
            <Heading slot="title" level={2} className="flex-1 pt-1 text-5">
              {title}
            </Heading>
            {!isBusy && role === "dialog" && (
              <IconButton icon="cross" label="Close" size="small" onPress={onClose} className="-mr-2" />
            )}
          </div>
          <div className="min-h-0 flex-1 space-y-4 overflow-y-auto px-6 pt-2 pb-5 max-wide:px-4">{children}</div>
          {actions && (
            <div className="flex flex-wrap justify-end gap-2 border-t border-line bg-card px-6 py-3 max-wide:px-4 max-wide:*:flex-1">
              {actions}
            </div>
          )}
        </DialogPanel>
      </Modal>
    </ModalOverlay>
  );
}
