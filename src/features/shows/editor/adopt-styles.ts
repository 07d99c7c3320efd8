import { StyleModule } from "style-mod";

/**
 * Lets CodeMirror put its styles into the page without a `<style>` element, which our content policy
 * forbids. Its style keeper (style-mod 4.1) uses an adopted stylesheet in shadow roots but an element
 * in documents; one keeper made for a shadow root serves a whole document, so we make it and hand it
 * to the document under the key that style-mod looks up. Call before the first editor.
 */
export function adoptEditorStyles(target: Document = document): void {
  const key = findKeeperKey(target);
  if (!key || key in target) return;
  Object.defineProperty(target, key, {
    value: Reflect.get(createKeeperRoot(target), key),
    configurable: true,
    writable: true,
  });
}

function createKeeperRoot(target: Document): ShadowRoot {
  const root = target.createElement("div").attachShadow({ mode: "open" });
  StyleModule.mount(root, new StyleModule({ ".cm-adopted": { display: "contents" } }));
  return root;
}

function findKeeperKey(target: Document): symbol | undefined {
  return Object.getOwnPropertySymbols(createKeeperRoot(target)).find((symbol) => symbol.description === "styleSet");
}
