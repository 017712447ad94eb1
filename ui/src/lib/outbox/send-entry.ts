import type { EntryReceipt } from '@stubpost/shared';
import { api, ApiError } from '../api-client';
import { errorText } from '../error-texts';
import type { SendOutcome } from './outbox';
import type { OutboxEntry } from './outbox-entry';

/** Longest wait for one answer; after that the same id is tried again. Our choice. */
const patienceMilliseconds = 10_000;

/** An answer without a place in the log is no receipt, whatever its status says. */
function isReceipt(answer: Partial<EntryReceipt> | undefined): answer is EntryReceipt {
  return Number.isInteger(answer?.sequence) && typeof answer?.hash === 'string' && answer.hash !== '';
}

function outcomeOf(problem: unknown): SendOutcome {
  if (!(problem instanceof ApiError)) return { kind: 'failed' };
  if (problem.code === 'transport.unreachable') return { kind: 'unreachable' };
  if (problem.code === 'session.missing' || problem.code === 'session.other_person')
    return { kind: 'signed-out' };
  const isForLater =
    problem.code === 'transport.unreadable' ||
    problem.code.startsWith('session.') ||
    problem.code === 'request.too_many';
  const isFinal = problem.status >= 400 && problem.status < 500 && !isForLater;
  return isFinal ? { kind: 'refused', code: problem.code, message: errorText(problem) } : { kind: 'failed' };
}

/** One try to bring an entry to the log, as the person who made it and nobody else. */
export async function sendEntry({ turn, payload, personId }: OutboxEntry): Promise<SendOutcome> {
  try {
    const path = `/api/turns/${encodeURIComponent(turn)}/entries`;
    const answer = await api.post<EntryReceipt>(path, payload, {
      signal: AbortSignal.timeout(patienceMilliseconds),
      asPerson: personId,
    });
    return isReceipt(answer) ? { kind: 'received', receipt: answer } : { kind: 'failed' };
  } catch (problem) {
    return outcomeOf(problem);
  }
}
