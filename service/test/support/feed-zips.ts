import type { WireTimetable } from '@stubpost/shared';
import type { FeedTexts } from '@stubpost/shared/testing';
import { strToU8, zipSync } from 'fflate';
import type { SignedInAgent } from './sign-in';

/** The files of a feed as a zip. */
export function zipOf(texts: FeedTexts): Buffer {
  const files = Object.fromEntries(Object.entries(texts).map(([name, text]) => [name, strToU8(text)]));
  return Buffer.from(zipSync(files, { level: 6 }));
}

/** Sends a zip and gives the answer as it came. */
export function upload(person: SignedInAgent, zip: Buffer, fields: Record<string, string> = {}) {
  const request = person.agent.post('/api/timetables');
  for (const [name, value] of Object.entries(fields)) void request.field(name, value);
  return request.attach('file', zip, 'winter.zip');
}

/** The timetable once it has been read, well or not. */
export async function untilRead(person: SignedInAgent, id: string): Promise<WireTimetable> {
  for (;;) {
    const { body } = await person.agent.get(`/api/timetables/${id}`).expect(200);
    const timetable = body as WireTimetable;
    if (timetable.state !== 'reading') return timetable;
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
}

/** Sends a zip that is expected to be taken in, and waits until it has been read. */
export async function bringIn(
  person: SignedInAgent,
  zip: Buffer,
  fields: Record<string, string> = {},
): Promise<WireTimetable> {
  const answer = await upload(person, zip, fields).expect(202);
  return untilRead(person, (answer.body as { id: string }).id);
}
