import type { EntryReceipt } from '@stubpost/shared';
import { api, ApiError } from '../../../lib/api-client';
import { errorText } from '../../../lib/error-texts';
import type { SendOutcome, WaitingEntry } from '../model/entry-queue';

/** Longest wait for one answer; after that the same id is tried again. Our choice. */
const patienceMilliseconds = 10_000;

/** A no that no later try would change: our own refusal of the content or of the writer. */
function isFinal(problem: unknown): problem is ApiError {
  if (!(problem instanceof ApiError) || problem.code === 'transport.unreadable') return false;
  if (problem.code.startsWith('session.') || problem.code === 'request.too_many') return false;
  return problem.status >= 400 && problem.status < 500;
}

/** One try to bring an entry to the log. */
export async function sendEntry({ turnId, request }: WaitingEntry): Promise<SendOutcome> {
  try {
    const path = `/api/turns/${encodeURIComponent(turnId)}/entries`;
    const receipt = await api.post<EntryReceipt>(path, request, {
      signal: AbortSignal.timeout(patienceMilliseconds),
    });
    return { kind: 'received', receipt };
  } catch (problem) {
    if (isFinal(problem)) return { kind: 'refused', code: problem.code, message: errorText(problem) };
    return { kind: 'failed' };
  }
}
