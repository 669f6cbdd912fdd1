/** The four places of the product, in order, with their addresses. */
export const places = [
  { key: 'today', href: '/' },
  { key: 'jobs', href: '/jobs' },
  { key: 'lasers', href: '/lasers' },
  { key: 'crew', href: '/crew' },
] as const;

export type PlaceKey = (typeof places)[number]['key'];

/** The place that an address lies in; null for one outside all four (the account). What is not listed belongs to a job. */
export function placeOf(pathname: string): PlaceKey | null {
  if (pathname === '/') return 'today';
  if (pathname === '/account' || pathname.startsWith('/account/')) return null;
  return places.find(({ href }) => href !== '/' && (pathname === href || pathname.startsWith(`${href}/`)))?.key ?? 'jobs';
}

/** Whether an address is a place itself rather than something inside it: only there does a phone show the tabs. */
export function isTopLevel(pathname: string): boolean {
  return pathname === '/account' || places.some(({ href }) => href === pathname);
}
