import type { LiveEvent } from '@stubpost/shared';

/** Bytes of one event, made once for all its readers. */
export function liveEventBytes(event: LiveEvent, id: number, json: string): Buffer {
  return Buffer.from(`id: ${id}\nevent: ${event}\ndata: ${json}\n\n`);
}

/** The number a reader saw last, from its header or query; null when it names none that we could have given. */
export function parseLastEventId(text: string | undefined): number | null {
  if (text === undefined || !/^\d{1,15}$/.test(text)) return null;
  return Number(text);
}
