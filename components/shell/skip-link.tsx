/** The first stop of the Tab key: past the places, to the page itself. */
export function SkipLink() {
  return (
    <a
      href="#main"
      className="sr-only focus:not-sr-only focus:absolute focus:top-2 focus:left-2 focus:z-50 focus:rounded focus:bg-glass focus:px-4 focus:py-3 focus:font-bold focus:text-glass-on"
    >
      Skip to the page
    </a>
  );
}
