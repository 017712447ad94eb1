import { HTMLSelect } from '@blueprintjs/core';
import type { WireStepPlan } from '@stubpost/shared';
import { useState } from 'react';
import { comparePlans } from '../model/compare-plans';
import { versionName } from './version-list';

/** What is different between two versions, field by field. */
export function PlanCompare({ shown, versions }: { shown: WireStepPlan; versions: readonly WireStepPlan[] }) {
  const others = versions.filter(({ id }) => id !== shown.id);
  const [otherId, setOtherId] = useState('');
  const other = others.find(({ id }) => id === otherId);
  if (others.length === 0) return null;
  return (
    <section className="sp-panel" aria-labelledby="plan-compare">
      <header>
        <h2 id="plan-compare">Compare</h2>
        <HTMLSelect
          aria-label="Compare with"
          value={otherId}
          onChange={(event) => setOtherId(event.currentTarget.value)}
          options={[
            { value: '', label: 'with …' },
            ...others.map((version) => ({ value: version.id, label: versionName(version) })),
          ]}
        />
      </header>
      {other !== undefined && <Differences before={other} after={shown} />}
    </section>
  );
}

function Differences({ before, after }: { before: WireStepPlan; after: WireStepPlan }) {
  const differences = comparePlans(before, after);
  if (differences.length === 0) return <p>The steps of both versions are the same.</p>;
  return (
    <table className="sp-table">
      <thead>
        <tr>
          <th scope="col">Step</th>
          <th scope="col">What</th>
          <th scope="col">Version {before.version}</th>
          <th scope="col">Version {after.version}</th>
        </tr>
      </thead>
      <tbody>
        {differences.map((each) => (
          <tr key={`${each.step} ${each.what}`}>
            <th scope="row">{each.step}</th>
            <td>{each.what}</td>
            <td>{each.before}</td>
            <td>{each.after}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
