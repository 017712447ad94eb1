import type { ValueTransformer } from 'typeorm';

/**
 * Instants are bigint columns of epoch milliseconds. SQLite hands them over as numbers, PostgreSQL as text; this makes
 * both a number. Safe to the year 287396.
 */
export const instantTransformer: ValueTransformer = {
  to: (value: number | null | undefined) => value,
  from: (value: number | string | null) => (value === null ? null : Number(value)),
};

/** Options of an instant column: `@Column(instantColumn('observed_at'))`. */
export const instantColumn = (name: string) =>
  ({ name, type: 'bigint', transformer: instantTransformer }) as const;

/** Options of an instant column that may be empty. */
export const nullableInstantColumn = (name: string) => ({ ...instantColumn(name), nullable: true }) as const;

/** JSON kept as text, read and written as a value. */
export const jsonTransformer: ValueTransformer = {
  to: (value: unknown) => (value === undefined || value === null ? value : JSON.stringify(value)),
  from: (value: string | null): unknown => (value === null ? null : JSON.parse(value)),
};

/** Options of a column of JSON text. */
export const jsonColumn = (name: string) => ({ name, type: 'text', transformer: jsonTransformer }) as const;
