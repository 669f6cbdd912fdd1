import '@/hooks/i18n/i18n';
import { QueryClientProvider } from '@tanstack/react-query';
import { configure, render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactElement } from 'react';
import { createQueryClient } from '@/hooks/api/query-client';
import { sessionBegan } from '@/hooks/session/session-store';
import type { Role } from '@/shared/roles';

export const PERSON = '0198f000-0000-7000-8000-00000000aaaa';
export const COMPANY = '0198f000-0000-7000-8000-00000000bbbb';

// Asking jsdom for the computed style of every ancestor of every candidate costs most of a test's time; nothing here is hidden.
configure({ defaultHidden: true });

/** Draws a screen for somebody who is signed in with these roles, with a cache of its own. */
export function renderSignedIn(screen: ReactElement, roles: Role[] = ['owner', 'super', 'operator', 'installer']) {
  sessionBegan({
    accessToken: 'a token of the test',
    expiresAt: '2099-01-01T00:00:00Z',
    me: {
      person: { id: PERSON, name: 'Rosa Ibarra', email: 'rosa@crew.example' },
      company: { id: COMPANY, name: 'Heron Flats Concrete' },
      roles,
    },
  });
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retry: false } });
  return {
    person: userEvent.setup({ delay: null, pointerEventsCheck: 0 }),
    client,
    ...render(<QueryClientProvider client={client}>{screen}</QueryClientProvider>),
  };
}

/** Puts text into a field in place of what it holds, as one paste: a render for each key says nothing more. */
export async function fill(person: ReturnType<typeof userEvent.setup>, field: HTMLElement, text: string) {
  await person.clear(field);
  if (text !== '') await person.paste(text);
}
