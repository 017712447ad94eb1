import {
  may,
  terminalsWhere,
  type Permission,
  type SessionAnswer,
  type SignedInPerson,
} from '@stubpost/shared';
import { queryOptions, useQuery } from '@tanstack/react-query';
import { createContext, useContext, type ReactNode } from 'react';
import { api, isRefusal } from './api-client';
import { queryKeys } from './query-keys';

async function fetchSession(signal: AbortSignal): Promise<SignedInPerson | null> {
  try {
    const { person } = await api.get<SessionAnswer>('/api/session', { signal });
    return person;
  } catch (problem) {
    if (isRefusal(problem, 'session.missing')) return null;
    throw problem;
  }
}

/** Who is signed in; null when nobody is. Asked again every minute, since an administrator can end a session. */
export const sessionQuery = queryOptions({
  queryKey: queryKeys.session.all,
  queryFn: ({ signal }) => fetchSession(signal),
  staleTime: 60_000,
  refetchInterval: 60_000,
  refetchOnWindowFocus: true,
});

export interface SessionState {
  /** `unknown` until the service has answered for the first time. */
  state: 'unknown' | 'signed-out' | 'signed-in' | 'unreachable';
  person: SignedInPerson | null;
}

/** Whether somebody is signed in, and who. */
export function useSession(): SessionState {
  const { data, isError } = useQuery(sessionQuery);
  if (data === undefined) return { state: isError ? 'unreachable' : 'unknown', person: null };
  return { state: data === null ? 'signed-out' : 'signed-in', person: data };
}

const Person = createContext<SignedInPerson | null>(null);

/**
 * Holds the person for everything inside. The guard stands here: when a session ends, the parts inside keep the person
 * they were drawn with until the guard has taken them away.
 */
export function SignedInAs({ person, children }: { person: SignedInPerson; children: ReactNode }) {
  return <Person.Provider value={person}>{children}</Person.Provider>;
}

/** The person signed in, for pages behind the guard. */
export function usePerson(): SignedInPerson {
  const held = useContext(Person);
  const { person } = useSession();
  const known = held ?? person;
  if (known === null) throw new Error('This part of the page needs somebody signed in');
  return known;
}

/** Whether the person signed in may do a thing at a terminal, or anywhere when no terminal is named. */
export function useMay(permission: Permission, terminal?: string): boolean {
  const { person } = useSession();
  return person !== null && may(person, permission, terminal);
}

/** Terminals at which the person signed in may do a thing; `*` alone when it is all of them. */
export function useTerminalsWhere(permission: Permission): string[] {
  const { person } = useSession();
  return person === null ? [] : terminalsWhere(person, permission);
}
