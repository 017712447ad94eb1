import type { WireAlertQuality } from '@stubpost/shared';
import { ALERT_CAUSE_WORDS } from '../../../components/words';
import { formatStamp } from '../../../lib/time-display';
import { count, percent, plural } from '../model/quality-words';
import { PlainTable } from './plain-table';

/** The ten sources that ring most. */
export function SourcesPanel({ quality, zone }: { quality: WireAlertQuality; zone: string }) {
  const { sources, sourceCount, share } = quality.sources;
  return (
    <section className="sp-panel" aria-labelledby="sources">
      <h2 id="sources">The ten busiest sources</h2>
      {sources.length === 0 ? (
        <p>Nothing to count: no alert in these days.</p>
      ) : (
        <>
          <p>
            {sources.length === sourceCount
              ? `There ${sourceCount === 1 ? 'is' : 'are'} only ${plural(sourceCount, 'source')}.`
              : `Together ${percent(share)} of all alerts, from ${sources.length} of ${count(sourceCount)} sources.`}
          </p>
          <PlainTable
            caption="The busiest sources of alerts"
            heads={[
              ['Cause', 'words'],
              ['Train', 'words'],
              ['Alerts', 'number'],
              ['Share', 'number'],
              ['Last raised', 'words'],
            ]}
            rows={sources.map((source) => ({
              key: `${source.cause} ${source.train ?? ''}`,
              cells: [
                ALERT_CAUSE_WORDS[source.cause],
                source.train ?? 'no train',
                count(source.count),
                percent(source.share),
                formatStamp(source.lastRaisedAt, zone),
              ],
            }))}
          />
        </>
      )}
      <footer>
        A source is one cause about one train number, whatever the day. Target for the ten together: 1 to 5 %
        of all alerts; EEMUA 191 and ISA-18.2, second-hand.
      </footer>
    </section>
  );
}
