/** Where the page itself was loaded from, as far as that changes what it may promise. */
export interface PageOrigin {
  /** Plain http from another machine: no offline work, and anybody on the way can read along. */
  isUnencrypted: boolean;
}

const LOCAL_HOSTS = ['localhost', '127.0.0.1', '[::1]'];

/** What the address of the page says. */
export function pageOrigin(location: Pick<Location, 'protocol' | 'hostname'>): PageOrigin {
  return { isUnencrypted: location.protocol === 'http:' && !LOCAL_HOSTS.includes(location.hostname) };
}
