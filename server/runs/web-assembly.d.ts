/** What Node has of WebAssembly and its types leave out: as much as the engine's host uses. */
declare namespace WebAssembly {
  interface Memory {
    readonly buffer: ArrayBuffer;
  }
  const Memory: new (descriptor: { readonly initial: number; readonly maximum: number }) => Memory;
  function compile(bytes: Uint8Array): Promise<Module>;
}
