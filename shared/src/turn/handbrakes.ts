import type { Instant } from '../lib/instant';
import { rolesOf } from '../plan/step-roles';
import type { PlanStep } from '../plan/step-plan';
import { compareTimes, type Account } from './account';
import { ENTRY_SOURCES } from './entry';
import type { TieUp } from './remarks';
import { weighAccounts } from './rulings';
import type { EntryOf } from './standing-entries';

/** What the entries say about the handbrakes of a turn. */
export interface Handbrakes {
  /** How many were set by the account that counts; null while none is recorded or it gives no count. */
  set: number | null;
  /** How many were released; null when a release without a count says that all are. */
  released: number | null;
  /** Cars with a handbrake set and not yet released, where both records name cars. */
  carsStillSet: string[];
  /** How many stand set, after each change: a set without a count is 1, a release without a count takes all off. */
  log: { at: Instant; standing: number }[];
}

/** No handbrake is said to be set by this account: its count is 0. */
export function setsNone(account: Account): boolean {
  return account.reading?.count === 0;
}

/**
 * The accounts by which a release is complete. A release that gives no count, or at least as many as were set, is
 * complete by itself. Smaller ones are added up within one source, by car where cars are named; two sources that
 * tell of the same brake are not added. Where no count was given when they were set, any release is complete.
 */
export function completeReleases(releases: readonly Account[], set: number | null): Account[] {
  const whole = releases.filter((release) => isWhole(release, set));
  if (set === null) return whole;
  const part = releases.filter((release) => !isWhole(release, set));
  const summed = ENTRY_SOURCES.flatMap((source) => {
    const own = part.filter((release) => release.source === source).sort(compareTimes);
    const enough = own.findIndex((_, index) => releasedBy(own.slice(0, index + 1)) >= set);
    const last = own[enough];
    return last === undefined ? [] : [last];
  });
  return [...whole, ...summed];
}

function isWhole({ reading }: Account, set: number | null): boolean {
  const count = countOf(reading);
  return count === null || set === null ? count !== 0 : count >= set;
}

/** The count of a reading; where only cars are named, their number. */
function countOf(reading: Account['reading']): number | null {
  return reading?.count ?? reading?.cars?.length ?? null;
}

/** How many are off by these releases together: named cars once each, counts without cars added. */
function releasedBy(releases: readonly Account[]): number {
  const cars = new Set<string>();
  let unnamed = 0;
  for (const { reading } of releases) {
    const named = reading?.cars ?? [];
    for (const car of named) cars.add(car);
    unnamed += Math.max(0, (countOf(reading) ?? 0) - named.length);
  }
  return cars.size + unnamed;
}

/** What else bears on the handbrakes: rulings on accounts, and how the set was left. */
export interface HandbrakeWords {
  rulings: readonly EntryOf<'ruled'>[];
  tiedUp: TieUp | null;
}

/** Adds up what was set and released. `accounts` gives the standing accounts of each step by its key. */
export function countHandbrakes(
  steps: readonly PlanStep[],
  accounts: ReadonlyMap<string, readonly Account[]>,
  { rulings, tiedUp }: HandbrakeWords,
): Handbrakes {
  const { secure, release } = rolesOf(steps);
  const of = (some: readonly PlanStep[]): Account[] => some.flatMap((step) => accounts.get(step.key) ?? []);
  const sets = of(secure);
  const releases = of(release);
  const setting = sets.filter((account) => !setsNone(account));
  const counting = weighAccounts(setting, rulings).accounts[0];
  const set = countOf(counting?.reading ?? null);
  const carsSet = counting?.reading?.cars ?? [];
  const carsOff = new Set(releases.flatMap((each) => each.reading?.cars ?? []));
  const carsStillSet = carsOff.size > 0 ? carsSet.filter((car) => !carsOff.has(car)) : [];
  return {
    set,
    released: releasedCount(releases, set),
    carsStillSet,
    log: withTieUp(logOf(sets, releases), tiedUp),
  };
}

function releasedCount(releases: readonly Account[], set: number | null): number | null {
  if (releases.some((release) => countOf(release.reading) === null)) return null;
  const whole = releases.filter((release) => isWhole(release, set));
  if (whole.length > 0) return Math.max(...whole.map((release) => countOf(release.reading) ?? 0));
  const bySource = ENTRY_SOURCES.map((source) =>
    releasedBy(releases.filter((release) => release.source === source)),
  );
  return Math.max(...bySource);
}

/** The record of a tie-up says how many stand at that moment, whatever was added up before. */
function withTieUp(log: Handbrakes['log'], tiedUp: TieUp | null): Handbrakes['log'] {
  if (tiedUp === null) return log;
  const { at } = tiedUp;
  const after = log.findIndex((change) => change.at > at);
  const place = after < 0 ? log.length : after;
  return [...log.slice(0, place), { at, standing: tiedUp.handbrakes.count }, ...log.slice(place)];
}

function logOf(sets: readonly Account[], releases: readonly Account[]): Handbrakes['log'] {
  const changes = [
    ...sets.map((account) => ({ account, isRelease: false })),
    ...releases.map((account) => ({ account, isRelease: true })),
  ].sort((a, b) => compareTimes(a.account, b.account));
  let standing = 0;
  return changes.map(({ account, isRelease }) => {
    const count = countOf(account.reading);
    if (isRelease) standing = Math.max(0, standing - (count ?? standing));
    else standing = Math.max(standing, count ?? 1);
    return { at: account.at, standing };
  });
}
