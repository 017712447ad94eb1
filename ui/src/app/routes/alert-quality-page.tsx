import { useSearchParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, ErrorState, LoadingRows } from '../../components/page-states';
import { PartBoundary } from '../../components/part-boundary';
import { QualityView } from '../../features/alert-quality/components/quality-view';
import { RangeFields } from '../../features/alert-quality/components/range-fields';
import { readQualityRange, writeQualityRange } from '../../features/alert-quality/model/quality-range';
import { useTerminalChoice } from '../../lib/terminal-choice';
import { dateAt } from '../../lib/time-display';
import { useNow } from '../../lib/use-now';
import { AlertPages } from './alert-pages';

/** How useful the alerts of the chosen terminal's desk were. */
export function AlertQualityPage() {
  const { terminal, isPending, error } = useTerminalChoice();
  const [search, setSearch] = useSearchParams();
  const now = useNow(60);
  if (error !== null) return <ErrorState error={error} />;
  if (isPending) return <LoadingRows what="terminals" />;
  if (terminal === null) return <EmptyState words="There is no terminal here that you may look at." />;
  const today = dateAt(now, terminal.zone);
  const range = readQualityRange(search, today);
  return (
    <div className="sp-page">
      <AlertPages />
      <PageHeader title="Alert quality">
        <span className="muted">{terminal.name}</span>
      </PageHeader>
      <RangeFields
        range={range}
        today={today}
        onChange={(next) => setSearch((current) => writeQualityRange(current, next), { replace: true })}
      />
      <PartBoundary part="This report" rest="The other pages are fine.">
        <QualityView terminal={terminal} range={range} />
      </PartBoundary>
    </div>
  );
}
