import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { WireAlertQuality, WireTerminal } from '@stubpost/shared';
import { EmptyState, ErrorState, LoadingRows } from '../../../components/page-states';
import { formatServiceDateWithYear } from '../../../lib/time-display';
import { alertQualityQuery } from '../api/alert-quality-queries';
import type { QualityRange } from '../model/quality-range';
import { plural, afterwardsWords } from '../model/quality-words';
import { RepeatersPanel, StandingPanel, UntakenPanel } from './attention-panels';
import { BurstsPanel, LoadHeadline, LoadPanel } from './load-panels';
import { PrecisionPanel } from './precision-panel';
import { PriorityPanel } from './priority-panel';
import { SourcesPanel } from './sources-panel';
import { WarningPanel } from './warning-panel';
import { YardstickPanel } from './yardstick-panel';
import styles from './quality.module.css';

const daysWords = ({ from, to }: Pick<QualityRange, 'from' | 'to'>): string =>
  from === to
    ? `on ${formatServiceDateWithYear(from)}`
    : `from ${formatServiceDateWithYear(from)} to ${formatServiceDateWithYear(to)}`;

/** Nothing was raised: whether that is good news, or nobody was watching. */
function noAlertsWords(quality: WireAlertQuality): string {
  const days = daysWords(quality);
  if (quality.watchedTurns > 0)
    return `No alert was raised ${days}, on ${plural(quality.watchedTurns, 'turn')}.`;
  if (quality.unwatchedTurns > 0)
    return `There are no alerts ${days}. ${afterwardsWords(quality) ?? ''}`.trim();
  return `There are neither turns nor alerts at this terminal ${days}.`;
}

function Panels({ quality, zone }: { quality: WireAlertQuality; zone: string }) {
  return (
    <>
      <div className={styles.grid}>
        <LoadHeadline quality={quality} />
        <LoadPanel quality={quality} />
      </div>
      <YardstickPanel quality={quality} />
      <div className={styles.even}>
        <div className={styles.stack}>
          <PrecisionPanel quality={quality} />
          <PriorityPanel quality={quality} />
          <UntakenPanel quality={quality} />
        </div>
        <div className={styles.stack}>
          <WarningPanel quality={quality} />
          <SourcesPanel quality={quality} zone={zone} />
          <StandingPanel quality={quality} zone={zone} />
          <RepeatersPanel quality={quality} />
          <BurstsPanel quality={quality} zone={zone} />
        </div>
      </div>
    </>
  );
}

/** How useful the alerts of a terminal's desk were: load, precision, warning, sources, and what nobody cared for. */
export function QualityView({ terminal, range }: { terminal: WireTerminal; range: QualityRange }) {
  const { data, error, refetch, isPlaceholderData } = useQuery({
    ...alertQualityQuery(terminal.code, range),
    placeholderData: keepPreviousData,
  });
  const retry = (): void => void refetch();
  if (error !== null) return <ErrorState error={error} onRetry={retry} />;
  if (data === undefined)
    return <LoadingRows what="the quality of alerts" rows={8} rowHeight={60} onRetry={retry} />;
  const afterwards = afterwardsWords(data);
  const isMeasured = data.alerts > 0 || data.watchedTurns > 0;
  return (
    <div className={isPlaceholderData ? styles.loading : undefined} aria-busy={isPlaceholderData}>
      <div className={styles.stack}>
        {data.alerts === 0 && <EmptyState words={noAlertsWords(data)} />}
        {afterwards !== null && isMeasured && <p className="muted">{afterwards}</p>}
        {isMeasured && <Panels quality={data} zone={terminal.zone} />}
      </div>
    </div>
  );
}
