import { useEffect, useState } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Skeleton } from "../../../components/skeleton.tsx";
import { ScriptView } from "../editor/script-view.tsx";
import type { StudioVersion } from "./save-menu.tsx";

export interface VersionDialogProps {
  version: StudioVersion;
  readSource: (versionId: string) => Promise<string>;
  onUse: (source: string) => void;
  onClose: () => void;
}

/** An earlier version to read; its script may become the draft again (undo brings the other back). */
export function VersionDialog({ version, readSource, onUse, onClose }: VersionDialogProps) {
  const [source, setSource] = useState<string | null>(null);
  const [isFailed, setIsFailed] = useState(false);
  useEffect(() => {
    let isGone = false;
    readSource(version.id).then(
      (text) => isGone || setSource(text),
      () => isGone || setIsFailed(true),
    );
    return () => {
      isGone = true;
    };
  }, [version.id, readSource]);
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`${version.title}, ${version.when}`}
      size="wide"
      actions={
        <>
          <Button onPress={onClose}>Close</Button>
          <Button
            look="main"
            disabledReason={source === null ? "The version is still being read." : null}
            onPress={() => source !== null && onUse(source)}
          >
            Use this script
          </Button>
        </>
      }
    >
      {isFailed && <Notice tone="stop" role="alert" title="The version could not be read. Close this and try again." />}
      {source === null && !isFailed && <Skeleton shape="block" className="h-60" />}
      {source !== null && <ScriptView source={source} label={`Script of ${version.title}`} />}
    </Dialog>
  );
}
