import type { ReactNode } from "react";
import { Button } from "./button.tsx";
import { Notice } from "./notice.tsx";

export interface ErrorStateProps {
  /** What could not be done: "The class could not be loaded". */
  title: ReactNode;
  /** What it means and what is safe: "Nothing is lost. Try again, or come back in a minute." */
  children?: ReactNode;
  /** Tries again. */
  onRetry?: () => void;
  isRetrying?: boolean;
  /** Other ways out. */
  actions?: ReactNode;
  /** The request's id, for whoever looks after the installation. */
  requestId?: string | null;
  className?: string;
}

/** A part of a page that could not be loaded, with the way to try again. */
export function ErrorState({ title, children, onRetry, isRetrying, actions, requestId, className }: ErrorStateProps) {
  return (
    <Notice
      tone="stop"
      role="alert"
      title={title}
      className={className}
      actions={
        (onRetry || actions) && (
          <>
            {onRetry && (
              <Button icon="turn" onPress={onRetry} isPending={isRetrying}>
                Try again
              </Button>
            )}
            {actions}
          </>
        )
      }
    >
      {children}
      {requestId && (
        <p className="text-meta text-soft">
          If it happens again, give this number to whoever looks after Duskbell:{" "}
          <code className="font-mono">{requestId}</code>
        </p>
      )}
    </Notice>
  );
}
