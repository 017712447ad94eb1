import type { WireTimetable } from '@stubpost/shared';
import { formatServiceDate } from '../../../lib/time-display';
import { formatCount, readingTime } from '../model/timetable-words';
import styles from './timetables.module.css';

interface ImportStagesProps {
  timetable: WireTimetable;
  /** Stations that are chosen as terminals. */
  chosen: number;
  /** How much it differs from the running timetable, in words; empty while that is unknown. */
  differences: string;
}

interface Stage {
  name: string;
  detail: string;
}

function stagesOf({ timetable, chosen, differences }: ImportStagesProps): { stages: Stage[]; at: number } {
  const { problems, summary, state } = timetable;
  const isRead = state !== 'reading';
  const refusals = problems.filter(({ severity }) => severity === 'refused').length;
  const stations = summary?.stations.filter(({ turns }) => turns > 0).length ?? 0;
  const stages: Stage[] = [
    { name: 'Read', detail: isRead ? (readingTime(timetable) ?? '') : 'in the background' },
    { name: 'Problems', detail: isRead ? problemWords(problems.length, refusals) : '' },
    { name: 'Terminals', detail: summary === null ? '' : `${chosen} of ${stations} stations chosen` },
    { name: 'Differences', detail: differences },
    {
      name: 'Active',
      detail:
        timetable.activeFrom === null
          ? 'from a day you choose'
          : `from ${formatServiceDate(timetable.activeFrom)}`,
    },
  ];
  const at = { reading: 0, refused: 1, ready: chosen === 0 ? 2 : 3, active: 4, retired: 4 }[state];
  return { stages, at };
}

function problemWords(problems: number, refusals: number): string {
  if (refusals > 0) return 'file refused, nothing was changed';
  return problems === 0 ? 'none' : formatCount(problems);
}

/** Where an import stands, drawn as a turn: post, work done, open end. */
export function ImportStages(props: ImportStagesProps) {
  const { stages, at } = stagesOf(props);
  const looks = (index: number): string | undefined => {
    if (index < at) return styles.done;
    return index === at ? styles.at : undefined;
  };
  return (
    <ol className={styles.stages} aria-label={`Import of ${props.timetable.fileName}`}>
      {stages.map(({ name, detail }, index) => (
        <li
          key={name}
          className={looks(index)}
          {...(index === at ? { 'aria-current': 'step' as const } : {})}
        >
          <b>{name}</b>
          <span>{detail}</span>
        </li>
      ))}
    </ol>
  );
}
