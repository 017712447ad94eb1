import {
  dehydrate,
  hydrate,
  type DehydratedState,
  type Query,
  type QueryClient,
} from '@tanstack/react-query';
import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import { buildId } from '../config/environment';
import { homeOf } from './home';
import { queryKeys } from './query-keys';
import type { SignedInPerson } from '@stubpost/shared';
import { readDeviceClock } from './use-now';

/** How long what the service told can be read without it: a shift and the way home. Our choice. */
export const keptMilliseconds = 24 * 3600 * 1000;

/** Changes are gathered this long before they are written: live turns come every few seconds. Our choice. */
const gatherMilliseconds = 3000;
/** A start does not wait longer than this for what is kept. Our choice. */
const patienceMilliseconds = 1500;

/** What is written down: never without the build that understood it, the person it was for, and its age. */
interface KeptAnswers {
  build: string;
  personId: string;
  keptAt: number;
  state: DehydratedState;
}

interface AnswersDatabase extends DBSchema {
  answers: { key: string; value: KeptAnswers };
}

const place = 'all';
const open = (): Promise<IDBPDatabase<AnswersDatabase>> =>
  openDB<AnswersDatabase>('stubpost-answers', 1, {
    upgrade: (database) => database.createObjectStore('answers'),
  });

/** Areas that the phone reads without a signal. The desk's pages are always asked for anew. */
const KEPT_AREAS: readonly unknown[] = [
  queryKeys.session.all[0],
  queryKeys.terminals.all[0],
  queryKeys.turns.all[0],
  queryKeys.plans.all[0],
  queryKeys.crew.at('')[0],
  queryKeys.demo.all[0],
  queryKeys.setup.all[0],
];

const isKept = ({ queryKey, state }: Query): boolean =>
  state.status === 'success' && state.data !== null && KEPT_AREAS.includes(queryKey[0]);

/** Whose answers are kept: those of people who work on the phone. */
function reader(client: QueryClient): SignedInPerson | null {
  const person = client.getQueryData<SignedInPerson | null>(queryKeys.session.all) ?? null;
  return person !== null && homeOf(person) === '/my' ? person : null;
}

/** Whether what is kept may still be shown. */
export function isUsable(kept: Pick<KeptAnswers, 'build' | 'keptAt'> | undefined, now: number): boolean {
  if (kept === undefined || kept.build !== buildId) return false;
  const age = now - kept.keptAt;
  // A clock that was set back makes things look as if they came from the future; an hour of that is forgiven.
  return age <= keptMilliseconds && age >= -3_600_000;
}

/** Reads what an earlier visit kept, before the first page is drawn. A store that refuses or dawdles is done without. */
export async function restoreAnswers(client: QueryClient): Promise<void> {
  const read = async (): Promise<void> => {
    const database = await open();
    const kept = await database.get('answers', place);
    database.close();
    if (kept !== undefined && isUsable(kept, readDeviceClock())) {
      hydrate(client, kept.state, { defaultOptions: { queries: { gcTime: keptMilliseconds } } });
    }
  };
  const late = new Promise<void>((resolve) => setTimeout(resolve, patienceMilliseconds));
  await Promise.race([read().catch(() => undefined), late]);
}

async function write(client: QueryClient): Promise<void> {
  const person = reader(client);
  const database = await open();
  try {
    if (person === null) {
      // Nobody, or somebody of the desk: what the one before read is not for the next one.
      const isSignedOut = client.getQueryData(queryKeys.session.all) !== undefined;
      if (isSignedOut) await database.delete('answers', place);
      return;
    }
    const state = dehydrate(client, { shouldDehydrateQuery: isKept, shouldDehydrateMutation: () => false });
    const kept: KeptAnswers = { build: buildId, personId: person.id, keptAt: readDeviceClock(), state };
    await database.put('answers', kept, place);
  } finally {
    database.close();
  }
}

/** Throws away what is kept: whoever read it has signed out. */
export async function forgetAnswers(): Promise<void> {
  try {
    const database = await open();
    await database.delete('answers', place);
    database.close();
  } catch {
    // Nothing was kept.
  }
}

/** Keeps the answers written down from now on; what is left to write is written when the page goes out of sight. */
export function keepAnswers(client: QueryClient): () => void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const writeNow = (): void => {
    clearTimeout(timer);
    timer = undefined;
    void write(client).catch(() => undefined);
  };
  const stop = client.getQueryCache().subscribe(({ query }) => {
    if (timer === undefined && KEPT_AREAS.includes((query.queryKey as readonly unknown[])[0]))
      timer = setTimeout(writeNow, gatherMilliseconds);
  });
  const onHide = (): void => {
    if (document.visibilityState === 'hidden' && timer !== undefined) writeNow();
  };
  document.addEventListener('visibilitychange', onHide);
  return () => {
    stop();
    clearTimeout(timer);
    document.removeEventListener('visibilitychange', onHide);
  };
}
