import { Button } from '@blueprintjs/core';
import type { WireImportProblem } from '@stubpost/shared';
import { useState } from 'react';
import { formatCount, SEVERITY_WORDS } from '../model/timetable-words';
import styles from './timetables.module.css';

/** Problems shown before somebody asks for all. */
const shownAtFirst = 8;

function heading(problems: readonly WireImportProblem[]): string {
  if (problems.length === 0) return 'No problems';
  return problems.length === 1 ? '1 problem' : `${formatCount(problems.length)} problems`;
}

function closing(problems: readonly WireImportProblem[]): string {
  if (problems.some(({ severity }) => severity === 'refused')) {
    return 'The file is refused. Nothing was changed; the running timetable stays as it is. Mend the file and bring it in again.';
  }
  return problems.length === 0
    ? 'What would be wrong with the file is named here, with file and line.'
    : 'None of these stops the import. What was left out makes no turns; the rest stands.';
}

/** What is wrong with a file, with file and line, the worst first. */
export function ProblemList({ problems }: { problems: readonly WireImportProblem[] }) {
  const [isAll, setAll] = useState(false);
  const shown = isAll ? problems : problems.slice(0, shownAtFirst);
  return (
    <section className="sp-panel" aria-labelledby="problems">
      <header>
        <h2 id="problems">{heading(problems)}</h2>
        {problems.length > shownAtFirst && (
          <Button size="small" onClick={() => setAll(!isAll)}>
            {isAll ? `First ${shownAtFirst} only` : `All ${formatCount(problems.length)}`}
          </Button>
        )}
      </header>
      {problems.length > 0 && (
        <div
          className={`sp-table-scroll ${styles.problems}`}
          tabIndex={0}
          role="group"
          aria-label="Problems, table"
        >
          <table className="sp-table">
            <thead>
              <tr>
                <th scope="col">File</th>
                <th scope="col" className="number">
                  Line
                </th>
                <th scope="col">What is wrong</th>
                <th scope="col">What was done</th>
                <th scope="col">Code</th>
              </tr>
            </thead>
            <tbody>
              {shown.map((problem, index) => (
                <tr key={index}>
                  <td className="nowrap">{problem.file ?? 'whole file'}</td>
                  <td className="number">{problem.line === null ? '–' : formatCount(problem.line)}</td>
                  <td>{problem.message}</td>
                  <td className="nowrap">
                    <SeverityWord severity={problem.severity} />
                  </td>
                  <td className="nowrap muted">{problem.code}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <footer>{closing(problems)}</footer>
    </section>
  );
}

/** Only a refusal asks somebody to act. */
function SeverityWord({ severity }: Pick<WireImportProblem, 'severity'>) {
  const words = SEVERITY_WORDS[severity];
  return severity === 'refused' ? <span className={styles.refused}>{words}</span> : <>{words}</>;
}
