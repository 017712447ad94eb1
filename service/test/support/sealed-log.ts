import type { LogHead, LogVerdict } from '@stubpost/shared';
import { LogCheck } from '@stubpost/shared';
import type supertest from 'supertest';
import { sha256 } from '../../src/records/sha256';
import type { SignedInAgent } from './sign-in';

/** The exported log as a person gets it, for some days of receipt or whole. */
export async function exportOf(
  { agent }: Pick<SignedInAgent, 'agent'>,
  query: { from?: string; to?: string } = {},
): Promise<string> {
  const answer = await agent.get('/api/records/log').query(query).buffer(true).parse(asText).expect(200);
  return answer.body as string;
}

function asText(response: supertest.Response, done: (error: Error | null, body: unknown) => void): void {
  const stream = response as unknown as NodeJS.ReadableStream;
  let text = '';
  stream.setEncoding('utf8');
  stream.on('data', (chunk: string) => (text += chunk));
  stream.on('end', () => done(null, text));
}

/** Lines of an exported log. */
export const linesOf = (text: string): string[] => (text === '' ? [] : text.replace(/\n$/, '').split('\n'));

/** What the check says about an exported log. */
export function verdictOf(text: string, heads: readonly LogHead[] = []): LogVerdict {
  const check = new LogCheck({ sha256, heads });
  for (const line of linesOf(text)) check.take(line);
  return check.end();
}
