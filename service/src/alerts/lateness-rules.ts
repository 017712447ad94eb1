import { Injectable, type OnModuleDestroy, type OnModuleInit } from '@nestjs/common';
import {
  type AlertHoldTimes,
  type LatenessSettings,
  holdTimesOf,
  latenessSettingsOf,
} from '@stubpost/shared';
import type { Subscription } from 'rxjs';
import { ChangeFeed } from '../database/change-log';
import { TerminalsReadModel } from '../terminals/terminals.read-model';

/** What a terminal counts as late, silent and near, and how long before it is said. */
export interface TerminalRules {
  lateness: LatenessSettings;
  holds: AlertHoldTimes;
}

/** The rules of each terminal, read once and again after its supervisor has changed them. */
@Injectable()
export class LatenessRules implements OnModuleInit, OnModuleDestroy {
  private readonly known = new Map<string, TerminalRules>();
  private subscription: Subscription | undefined;

  constructor(
    private readonly terminals: TerminalsReadModel,
    private readonly feed: ChangeFeed,
  ) {}

  onModuleInit(): void {
    this.subscription = this.feed.changes.subscribe((change) => {
      if (change.kind === 'terminal') this.known.delete(change.terminalCode);
    });
  }

  onModuleDestroy(): void {
    this.subscription?.unsubscribe();
  }

  /** The rules of a terminal whose clocks show a zone. */
  async of(terminalCode: string, zone: string): Promise<TerminalRules> {
    const known = this.known.get(terminalCode);
    if (known !== undefined) return known;
    const thresholds = await this.terminals.thresholdsOf(terminalCode);
    const rules = { lateness: latenessSettingsOf(thresholds, zone), holds: holdTimesOf(thresholds) };
    this.known.set(terminalCode, rules);
    return rules;
  }
}
