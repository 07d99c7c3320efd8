import { useEffect } from "react";

/** Sets the document's title to "<title> · Duskbell" while the caller is on screen. */
export function useDocumentTitle(title: string) {
  useEffect(() => {
    document.title = `${title} · Duskbell`;
  }, [title]);
}
