/** The first stop of the keyboard: past the navigation, to the page. */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="absolute -top-20 left-4 z-50 rounded-cut bg-lamp px-4 py-2 font-semibold text-on-lamp no-underline focus:top-2"
      onClick={(event) => {
        // The router owns the address bar: move the focus without writing a hash.
        event.preventDefault();
        document.getElementById("main")?.focus();
      }}
    >
      Skip to the page
    </a>
  );
}
