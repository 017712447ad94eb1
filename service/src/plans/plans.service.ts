import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import {
  type CalendarDate,
  type CreatePlanRequest,
  type Instant,
  type PlanStep,
  checkPlan,
  defaultStepPlanKey,
  defaultStepPlanName,
  defaultStepPlanSteps,
} from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import { ChangeLog } from '../database/change-log';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { TurnRepository } from '../turns/turn.repository';
import { PlanRepository, type StoredPlan } from './plan.repository';

/** The plan a terminal starts with is in force on every day that no other is. */
const sinceEver = '2000-01-01';

/** What is needed to make a plan version. */
export interface CreatePlanCommand {
  terminalCode: string;
  request: CreatePlanRequest;
  authorName: string;
  now: Instant;
}

/** Step plans of terminals: which is in force on a day, and new versions. */
@Injectable()
export class PlansService {
  /** Versions never change, so each is read once. Steps keep their identity, by which sums about them are kept. */
  private readonly known = new Map<string, StoredPlan>();

  constructor(
    private readonly repository: PlanRepository,
    private readonly turns: TurnRepository,
    private readonly changes: ChangeLog,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** One version, or null when there is none of that id. */
  async find(id: string): Promise<StoredPlan | null> {
    return this.known.get(id) ?? this.remember(await this.repository.findById(id));
  }

  /** One version as an open transaction sees it: it may have been made in the same one. */
  async get(transaction: Transaction, id: string): Promise<StoredPlan> {
    const plan = this.known.get(id) ?? (await this.repository.findByIdIn(transaction, id));
    if (plan === null) throw new Error(`there is no step plan ${id}`);
    transaction.afterCommit(() => this.remember(plan));
    return plan;
  }

  /** The version in force at a terminal on a service date. A terminal without a plan gets the one we ship. */
  async inForce(
    transaction: Transaction,
    terminalCode: string,
    serviceDate: CalendarDate,
    now: Instant,
  ): Promise<StoredPlan> {
    const found = await this.repository.findInForce(transaction, terminalCode, serviceDate);
    if (found !== null) return this.known.get(found.id) ?? found;
    const version = 1 + (await this.repository.lastVersion(transaction, terminalCode, defaultStepPlanKey));
    return this.add(transaction, {
      id: randomUUID(),
      terminalCode,
      key: defaultStepPlanKey,
      name: defaultStepPlanName,
      version,
      effectiveFrom: sinceEver,
      steps: defaultStepPlanSteps,
      createdAt: now,
      createdBy: null,
    });
  }

  /** All versions of a terminal, the one that takes effect last first. */
  async listAt(terminalCode: string, now: Instant): Promise<StoredPlan[]> {
    const found = await this.repository.findAllAt(terminalCode);
    if (found.length > 0) return found;
    await this.unitOfWork.run((transaction) => this.inForce(transaction, terminalCode, sinceEver, now));
    return this.repository.findAllAt(terminalCode);
  }

  /** Whether any version of a terminal's plans has a step of that key. */
  async isStepAnywhere(terminalCode: string, step: string): Promise<boolean> {
    const plans = await this.repository.findAllAt(terminalCode);
    return plans.some((plan) => plan.steps.some((known) => known.key === step));
  }

  /** Makes a new version. Turns of its days on which nothing has happened yet are measured against it from now on. */
  create(command: CreatePlanCommand): Promise<StoredPlan> {
    const { terminalCode, request, now } = command;
    const steps: PlanStep[] = request.steps;
    const problems = checkPlan(steps);
    if (problems.length > 0) {
      throw new Refusal({
        code: 'plan.invalid',
        message: problems[0]?.message ?? 'the plan cannot be used',
        facts: { problems },
      });
    }
    return this.unitOfWork.run(async (transaction) => {
      await this.inForce(transaction, terminalCode, sinceEver, now);
      const version = 1 + (await this.repository.lastVersion(transaction, terminalCode, request.key));
      const plan = await this.add(transaction, {
        id: randomUUID(),
        terminalCode,
        key: request.key,
        name: request.name,
        version,
        effectiveFrom: request.effectiveFrom,
        steps,
        createdAt: now,
        createdBy: command.authorName,
      });
      await this.pinAgain(transaction, plan, now);
      return plan;
    });
  }

  private async add(transaction: Transaction, plan: StoredPlan): Promise<StoredPlan> {
    await this.repository.insert(transaction, plan);
    transaction.afterCommit(() => this.remember(plan));
    return plan;
  }

  private async pinAgain(transaction: Transaction, plan: StoredPlan, now: Instant): Promise<void> {
    const { terminalCode, effectiveFrom } = plan;
    for (const serviceDate of await this.turns.findDatesNotBegun(transaction, terminalCode, effectiveFrom)) {
      const inForce = await this.inForce(transaction, terminalCode, serviceDate, now);
      await this.turns.pinPlan(transaction, { terminalCode, serviceDate, planId: inForce.id });
    }
    await this.changes.append(transaction, {
      kind: 'terminal',
      objectId: terminalCode,
      version: plan.version,
      terminalCode,
    });
  }

  private remember<Plan extends StoredPlan | null>(plan: Plan): Plan {
    if (plan !== null && !this.known.has(plan.id)) this.known.set(plan.id, plan);
    return plan;
  }
}
