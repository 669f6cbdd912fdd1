import { cloneElement, isValidElement, type ReactNode } from 'react';

type Href = string | { pathname: string; params?: Record<string, string> };

/** The address that a link's parameters come to. */
export function addressOf(href: Href): string {
  if (typeof href === 'string') return href;
  return href.pathname.replace(/\[(\w+)\]/g, (_, name: string) => href.params?.[name] ?? '');
}

/**
 * Stands in for expo-router where a screen is drawn by itself: links are real links, and navigation is written down.
 * `jest.mock('expo-router', () => jest.requireActual('@/tests/support/linked-router').linkedRouter)`
 */
export const gone: string[] = [];
const go = (href: Href) => void gone.push(addressOf(href));

export const linkedRouter = {
  useRouter: () => ({ push: go, replace: go }),
  useLocalSearchParams: () => ({}),
  usePathname: () => '/',
  Link: ({ href, children }: { href: Href; children: ReactNode }) =>
    isValidElement<{ href: string }>(children) ? (
      cloneElement(children, { href: addressOf(href) })
    ) : (
      <a href={addressOf(href)}>{children}</a>
    ),
};
