import type { SetupAnswer } from '@stubpost/shared';
import { useMutation } from '@tanstack/react-query';
import { api, ApiError } from '../../../lib/api-client';

const secondMilliseconds = 1000;
const longestWaitSeconds = 60;

async function isEmptyNow(): Promise<boolean> {
  try {
    return (await api.get<SetupAnswer>('/api/setup')).needed;
  } catch (problem) {
    // While it starts anew the service does not answer: that is what is waited for.
    if (problem instanceof ApiError) return false;
    throw problem;
  }
}

async function leaveDemo(): Promise<void> {
  await api.post('/api/demo/leaving');
  for (let waited = 0; waited < longestWaitSeconds; waited += 1) {
    await new Promise((resolve) => setTimeout(resolve, secondMilliseconds));
    if (await isEmptyNow()) return;
  }
  throw new ApiError({ status: 0, code: 'transport.unreachable', message: 'The service did not come back' });
}

/** Leaves the demo: the service starts anew with an empty database beside it. Resolves when it is there. */
export function useLeaveDemo(onEmpty: () => void) {
  return useMutation({ mutationFn: leaveDemo, onSuccess: onEmpty });
}
