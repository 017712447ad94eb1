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

declare const __BUILD_ID__: string;

/** Names this build of the screens: a digest of their sources. Under test nothing is built, and there is only one. */
export const buildId: string = typeof __BUILD_ID__ === 'string' ? __BUILD_ID__ : 'unbuilt';
