const form = /^([−-]?)(\d{1,3}):([0-5]\d)$/;

/** A length of time as plans write it, minutes and seconds: 75 is "1:15", −300 is "−5:00". */
export function formatMinutes(seconds: number): string {
  const whole = Math.abs(seconds);
  const text = `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
  return seconds < 0 ? `−${text}` : text;
}

/** Reads "1:15" or "−5:00" as seconds; null when it is not written so. A bare number is not taken: minutes or seconds? */
export function parseMinutes(text: string): number | null {
  const match = form.exec(text.trim());
  if (match === null) return null;
  const seconds = Number(match[2]) * 60 + Number(match[3]);
  return match[1] === '' || seconds === 0 ? seconds : -seconds;
}

/** A moment counted from its anchor: "arrival + 2:00", "departure − 4:00". */
export function formatAnchored(anchor: 'arrival' | 'departure', offsetSeconds: number): string {
  const sign = offsetSeconds < 0 ? '−' : '+';
  return `${anchor} ${sign} ${formatMinutes(Math.abs(offsetSeconds))}`;
}
