import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { CreateTerminalRequest, WireTrack } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import type { Transaction } from '../database/unit-of-work';
import { TerminalRow } from './terminal.entity';
import { TrackRow } from './track.entity';

/** Rows of terminals and tracks: the writing side. */
@Injectable()
export class TerminalsRepository {
  constructor(private readonly clock: Clock) {}

  find(transaction: Transaction, code: string): Promise<TerminalRow | null> {
    return transaction.manager.findOneBy(TerminalRow, { code });
  }

  async require(transaction: Transaction, code: string): Promise<TerminalRow> {
    const terminal = await this.find(transaction, code);
    if (terminal === null) throw unknownTerminal(code);
    return terminal;
  }

  async insert(
    transaction: Transaction,
    terminal: CreateTerminalRequest & { id: string },
  ): Promise<TerminalRow> {
    const row: TerminalRow = { ...terminal, version: 1, createdAt: this.clock.now() };
    await transaction.manager.insert(TerminalRow, row);
    return row;
  }

  /** Gives the terminal its next version; the row as it then is. */
  async bump(transaction: Transaction, terminal: TerminalRow): Promise<TerminalRow> {
    const version = terminal.version + 1;
    await transaction.manager.update(
      TerminalRow,
      { id: terminal.id, version: terminal.version },
      { version },
    );
    return { ...terminal, version };
  }

  async rename(transaction: Transaction, terminal: TerminalRow, name: string): Promise<TerminalRow> {
    await transaction.manager.update(TerminalRow, { id: terminal.id }, { name });
    return this.bump(transaction, { ...terminal, name });
  }

  async zones(transaction: Transaction): Promise<Record<string, string>> {
    const rows = await transaction.manager.find(TerminalRow, { select: { code: true, zone: true } });
    return Object.fromEntries(rows.map(({ code, zone }) => [code, zone]));
  }

  async replaceTracks(
    transaction: Transaction,
    terminalId: string,
    tracks: readonly WireTrack[],
  ): Promise<void> {
    await transaction.manager.delete(TrackRow, { terminalId });
    for (const [position, track] of tracks.entries()) {
      await transaction.manager.insert(TrackRow, this.rowOf(terminalId, position, track));
    }
  }

  /** Adds tracks that are missing and says how many those were. */
  async addMissingTracks(
    transaction: Transaction,
    terminalId: string,
    labels: readonly string[],
  ): Promise<number> {
    const known = await transaction.manager.findBy(TrackRow, { terminalId });
    const knownLabels = new Set(known.map((track) => track.label));
    const missing = [...new Set(labels)].filter((label) => !knownLabels.has(label));
    const firstPosition = Math.max(-1, ...known.map((track) => track.position)) + 1;
    for (const [index, label] of missing.entries()) {
      await transaction.manager.insert(TrackRow, this.rowOf(terminalId, firstPosition + index, { label }));
    }
    return missing.length;
  }

  private rowOf(terminalId: string, position: number, track: WireTrack): TrackRow {
    return {
      id: randomUUID(),
      terminalId,
      position,
      label: track.label,
      lengthFeet: track.lengthFeet ?? null,
      cars: track.cars ?? null,
      gradePercent: track.gradePercent ?? null,
      markers: track.markers ?? [],
      createdAt: this.clock.now(),
    };
  }
}

/** The refusal for a code that no terminal has. */
export function unknownTerminal(code: string): Refusal {
  return new Refusal({
    code: 'terminal.unknown',
    message: `there is no terminal ${code}`,
    facts: { terminal: code },
  });
}
