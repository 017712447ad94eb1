import { type WireStepPlan, formatInstant } from '@stubpost/shared';
import type { StoredPlan } from './plan.repository';

/** A plan version as the routes give it. */
export function wirePlanOf(plan: StoredPlan): WireStepPlan {
  return {
    id: plan.id,
    key: plan.key,
    name: plan.name,
    version: plan.version,
    effectiveFrom: plan.effectiveFrom,
    steps: plan.steps,
    terminal: plan.terminalCode,
    createdAt: formatInstant(plan.createdAt),
    createdBy: plan.createdBy,
  };
}
