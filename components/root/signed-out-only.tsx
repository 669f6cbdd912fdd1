import { Redirect, useLocalSearchParams, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import { useSession } from '@/hooks/session/use-session';

/** An address inside the app; anything else in the query is somebody's trap and leads to Today. */
export function insideAddress(next: unknown): Href {
  return typeof next === 'string' && /^\/(?![/\\])/.test(next) ? (next as Href) : '/'; // an address of ours, not known by name here
}

/** Sign-in and sign-up; who is signed in goes on to where they were going. */
export function SignedOutOnly({ children }: { children: ReactNode }) {
  const { status } = useSession();
  const { next } = useLocalSearchParams();
  if (status === 'signed-in') return <Redirect href={insideAddress(next)} />;
  return children;
}
