/**
 * The outcome of something that may be refused for a reason a person can understand.
 * Refusals are values; exceptions are kept for broken promises of our own code.
 */
export type Result<Value, Refusal> = { ok: true; value: Value } | { ok: false; error: Refusal };

/** Wraps a value as an accepted outcome. `ok(3)` is `{ ok: true, value: 3 }`. */
export function ok<Value>(value: Value): { ok: true; value: Value } {
  return { ok: true, value };
}

/** Wraps a reason as a refused outcome. `refused({ code: 'plan.cycle' })` is `{ ok: false, error: … }`. */
export function refused<Refusal>(error: Refusal): { ok: false; error: Refusal } {
  return { ok: false, error };
}
