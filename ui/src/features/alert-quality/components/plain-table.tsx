import type { ReactNode } from 'react';
import styles from './quality.module.css';

/** A heading and whether its column holds numbers. */
export type TableHead = readonly [name: string, kind: 'words' | 'number'];

interface PlainTableProps {
  caption: string;
  heads: readonly TableHead[];
  /** The first cell of a row names it. */
  rows: readonly { key: string; cells: readonly ReactNode[] }[];
}

/** A table that says what it is and scrolls by itself where it is too wide. */
export function PlainTable({ caption, heads, rows }: PlainTableProps) {
  return (
    <div className="sp-table-scroll" tabIndex={0} role="region" aria-label={caption}>
      <table className={`sp-table ${styles.table}`}>
        <caption className="unseen">{caption}</caption>
        <thead>
          <tr>
            {heads.map(([name, kind]) => (
              <th key={name} scope="col" className={kind === 'number' ? 'number' : undefined}>
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ key, cells }) => (
            <tr key={key}>
              {cells.map((cell, index) =>
                index === 0 ? (
                  <th key={heads[index]?.[0]} scope="row">
                    {cell}
                  </th>
                ) : (
                  <td
                    key={heads[index]?.[0]}
                    className={heads[index]?.[1] === 'number' ? 'number' : undefined}
                  >
                    {cell}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
