import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type {
  CreateTerminalRequest,
  ReplaceTracksRequest,
  UpdateTerminalSettingsRequest,
} from '@stubpost/shared';
import type { CurrentPersonFacts } from '../common/signed-in';
import { Refusal } from '../common/refusal';
import { ChangeLog } from '../database/change-log';
import { Settings } from '../database/settings';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import type { TerminalRow } from './terminal.entity';
import { type KeptSettings, TerminalsReadModel, THRESHOLDS } from './terminals.read-model';
import { TerminalsRepository } from './terminals.repository';

/** Terminals, their tracks and their thresholds. */
@Injectable()
export class TerminalsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly terminals: TerminalsRepository,
    private readonly readModel: TerminalsReadModel,
    private readonly settings: Settings,
    private readonly changes: ChangeLog,
  ) {}

  async add(request: CreateTerminalRequest): Promise<void> {
    await this.unitOfWork.run((transaction) => this.addIn(transaction, request));
  }

  /** Adds a terminal inside a larger piece of work, such as the activation of a timetable. */
  async addIn(transaction: Transaction, request: CreateTerminalRequest): Promise<TerminalRow> {
    requireZone(request.zone);
    if ((await this.terminals.find(transaction, request.code)) !== null) {
      throw new Refusal({
        code: 'terminal.exists',
        message: `there is a terminal ${request.code}`,
        facts: { terminal: request.code },
      });
    }
    const terminal = await this.terminals.insert(transaction, { id: randomUUID(), ...request });
    await this.tell(transaction, terminal);
    return terminal;
  }

  /** Makes sure that there is a terminal with this code and name. A known one keeps its zone. */
  async ensureIn(transaction: Transaction, request: CreateTerminalRequest): Promise<void> {
    const terminal = await this.terminals.find(transaction, request.code);
    if (terminal === null) await this.addIn(transaction, request);
    else if (terminal.name !== request.name) {
      await this.tell(transaction, await this.terminals.rename(transaction, terminal, request.name));
    }
  }

  /** Zones of all terminals by code, as an open transaction sees them. */
  zonesIn(transaction: Transaction): Promise<Record<string, string>> {
    return this.terminals.zones(transaction);
  }

  async replaceTracks(code: string, tracks: ReplaceTracksRequest): Promise<void> {
    const labels = tracks.map((track) => track.label);
    const twice = labels.find((label, index) => labels.indexOf(label) !== index);
    if (twice !== undefined) {
      throw new Refusal({
        code: 'terminal.track_twice',
        message: `track ${twice} is there twice`,
        facts: { track: twice },
      });
    }
    await this.unitOfWork.run(async (transaction) => {
      const terminal = await this.terminals.require(transaction, code);
      await this.terminals.replaceTracks(transaction, terminal.id, tracks);
      await this.tell(transaction, await this.terminals.bump(transaction, terminal));
    });
  }

  /** Makes sure that a terminal has tracks with these labels, adding the missing ones at the end of the board. */
  async ensureTracksIn(transaction: Transaction, code: string, labels: readonly string[]): Promise<void> {
    const terminal = await this.terminals.require(transaction, code);
    const added = await this.terminals.addMissingTracks(transaction, terminal.id, labels);
    if (added > 0) await this.tell(transaction, await this.terminals.bump(transaction, terminal));
  }

  async changeSettings(
    code: string,
    request: UpdateTerminalSettingsRequest,
    person: CurrentPersonFacts,
  ): Promise<void> {
    await this.unitOfWork.run(async (transaction) => {
      const terminal = await this.terminals.require(transaction, code);
      const { version, briefingRequired: before } = await this.readModel.settingsOf(code);
      if (version !== request.version) {
        throw new Refusal({ code: 'settings.changed', message: 'somebody changed these settings meanwhile' });
      }
      await this.settings.put(transaction, {
        scope: code,
        name: THRESHOLDS,
        value: {
          ...request.thresholds,
          briefingRequired: request.briefingRequired ?? before,
        } satisfies KeptSettings,
        changedBy: person.name,
      });
      await this.tell(transaction, await this.terminals.bump(transaction, terminal));
    });
  }

  private async tell(transaction: Transaction, terminal: TerminalRow): Promise<void> {
    await this.changes.append(transaction, {
      kind: 'terminal',
      objectId: terminal.id,
      version: terminal.version,
      terminalCode: terminal.code,
    });
  }
}

function requireZone(zone: string): void {
  try {
    new Intl.DateTimeFormat('en-US', { timeZone: zone });
  } catch {
    throw new Refusal({
      code: 'terminal.zone_unknown',
      message: `there is no time zone ${zone}`,
      facts: { zone },
    });
  }
}
