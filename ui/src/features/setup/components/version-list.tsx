import type { WireStepPlan } from '@stubpost/shared';
import { formatServiceDateWithYear, formatStamp } from '../../../lib/time-display';
import styles from './setup.module.css';

/** A plan that is in force from the beginning carries a date before any railroad data. */
const sinceEver = '2000-01-01';

/** From when a version holds: "from Tue 3 Mar 2026", or "from the start". */
export function fromWords({ effectiveFrom }: Pick<WireStepPlan, 'effectiveFrom'>): string {
  return effectiveFrom <= sinceEver ? 'from the start' : `from ${formatServiceDateWithYear(effectiveFrom)}`;
}

/** A version in one line: "Version 3, from Tue 3 Mar 2026". */
export function versionName(version: WireStepPlan): string {
  return `Version ${version.version}, ${fromWords(version)}`;
}

export interface VersionListProps {
  versions: readonly WireStepPlan[];
  shownId: string | null;
  inForceId: string | null;
  zone: string;
  onShow: (id: string) => void;
}

/** All versions of a plan, newest first; which is in force today, who made each and when. */
export function VersionList({ versions, shownId, inForceId, zone, onShow }: VersionListProps) {
  return (
    <section className="sp-panel" aria-labelledby="plan-versions">
      <header>
        <h2 id="plan-versions">Versions</h2>
      </header>
      <ul className={styles.versions}>
        {versions.map((version) => (
          <li key={version.id}>
            <button
              type="button"
              className={styles.pick}
              aria-pressed={version.id === shownId}
              onClick={() => onShow(version.id)}
            >
              Version {version.version}
            </button>
            <span>{fromWords(version)}</span>
            {version.id === inForceId && <b>in force today</b>}
            <span className="muted">
              {version.createdBy === null
                ? 'as shipped'
                : `${version.createdBy}, ${formatStamp(version.createdAt, zone)}`}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
