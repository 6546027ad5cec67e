/** The pictures of the main places, drawn like the state marks: a bench, a still, a receiver, a stack with a pen. */
const PICTURES: Record<string, string> = {
  '/bench': 'M2 14.5h20M4.5 14.5v6M19.5 14.5v6M9.5 4v3.2a3.7 3.7 0 1 0 3 0V4M8.5 4h5M17.5 9.5v4.5',
  '/runs': 'M5.5 8v3.5a4.5 4.5 0 1 0 3.5 0V4.5l9 5.5v5M15.5 15h5l-1 5.5h-3ZM5.5 8V4M4.5 4h5',
  '/fractions': 'M8.5 3v6.2a6.2 6.2 0 1 0 7 0V3M7 3h10M6.5 15.5h11',
  '/queue': 'M4 5.5h16M4 10h16M4 14.5h7M12.5 20l.8-3 6-6 2.2 2.2-6 6Z',
  more: 'M4 6.5h16M4 12h16M4 17.5h16',
};

/** The picture of a place by its path, or of the menu for "more". Decorative: the word stands beside it. */
export function PlaceIcon({ of }: { of: string }) {
  return (
    <svg
      width="24"
      height="24"
      viewBox="0 0 24 24"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      <path d={PICTURES[of] ?? PICTURES.more} />
    </svg>
  );
}
