import type { WireAlertQuality } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';
import type { QualityRange } from '../model/quality-range';

/** How useful the alerts of a terminal's desk were in a range of days. */
export const alertQualityQuery = (terminal: string, { from, to, afterwards }: QualityRange) => {
  const query = { terminal, from, to, afterwards };
  return queryOptions({
    queryKey: queryKeys.alerts.quality(query),
    queryFn: ({ signal }) => api.get<WireAlertQuality>('/api/alerts/quality', { signal, query }),
  });
};
