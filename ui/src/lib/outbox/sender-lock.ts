/** A page that holds the right to send and does not come back within this time is not waited for. Our choice. */
const patienceMilliseconds = 20_000;

/**
 * Lets one page of this browser send at a time, so that the order inside a turn holds across pages. A page that was put
 * to sleep while sending is overtaken after a while: the service takes the same entry only once. Browsers without locks
 * (plain http away from this machine) go ahead at once for the same reason.
 */
export function senderLock(name: string): (work: () => Promise<void>) => Promise<void> {
  return async (work) => {
    // Absent on plain http, whatever the types say.
    const locks = navigator.locks as LockManager | undefined;
    if (locks === undefined) return work();
    let isBegun = false;
    const begin = (): Promise<void> => {
      isBegun = true;
      return work();
    };
    try {
      await locks.request(name, { signal: AbortSignal.timeout(patienceMilliseconds) }, begin);
    } catch (problem) {
      if (isBegun) throw problem;
      await begin();
    }
  };
}
