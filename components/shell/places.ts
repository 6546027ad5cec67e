export type Place = { href: string; label: string; hint: string; adminsOnly?: boolean };

/** The places that are always in sight; the phone's bar has these four and the menu. */
export const MAIN_PLACES: readonly Place[] = [
  { href: '/bench', label: 'Bench', hint: 'what waits for you' },
  { href: '/runs', label: 'Runs', hint: 'distillations' },
  { href: '/fractions', label: 'Fractions', hint: 'find a receiver' },
  { href: '/queue', label: 'Queue', hint: 'fractions to sign off' },
];

/** Everything else, in the menu. */
export const MORE_PLACES: readonly Place[] = [
  { href: '/tray', label: 'Tray', hint: 'files that wait for their fraction' },
  { href: '/compounds', label: 'Compounds', hint: 'literature values and specifications' },
  { href: '/still-planner', label: 'Still planner', hint: 'boiling points and pressures' },
  { href: '/audit', label: 'Audit trail', hint: 'who did what' },
  {
    href: '/administration',
    label: 'Administration',
    hint: 'accounts, groups, instruments',
    adminsOnly: true,
  },
  { href: '/account', label: 'Account', hint: 'your name and password' },
];

/** Whether a path lies at or under a place. */
export function isWithin(pathname: string, href: string): boolean {
  return pathname === href || pathname.startsWith(`${href}/`);
}
