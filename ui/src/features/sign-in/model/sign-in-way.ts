/** The two ways of saying who one is. */
export type SignInWay = 'badge' | 'email';

const place = 'stubpost.sign-in-way';

/** The way this browser was used last; where it never was, a phone begins with the badge and a desk with the address. */
export function usualWay(isPhone: boolean): SignInWay {
  const kept = localStorage.getItem(place);
  if (kept === 'badge' || kept === 'email') return kept;
  return isPhone ? 'badge' : 'email';
}

/** Remembers a way for the next time. */
export function rememberWay(way: SignInWay): void {
  localStorage.setItem(place, way);
}
