import { Injectable } from '@nestjs/common';
import {
  formatInstant,
  shippedThresholds,
  type StoppingMarker,
  type TerminalThresholds,
  type WireTerminal,
  type WireTerminalSettings,
  type WireTrack,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { Settings } from '../database/settings';
import { unknownTerminal } from './terminals.repository';

/** Name of the setting that holds a terminal's thresholds. */
export const THRESHOLDS = 'thresholds';

/** What is kept under that name: the thresholds, and beside them what the phone asks for. */
export type KeptSettings = TerminalThresholds & { briefingRequired: boolean };

interface TerminalTrackRow {
  id: string;
  version: number;
  code: string;
  name: string;
  zone: string;
  label: string | null;
  length_feet: number | null;
  cars: number | null;
  grade_percent: number | null;
  markers: string | null;
}

/** Terminals as every page needs them: few, small, with their tracks. */
@Injectable()
export class TerminalsReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly settings: Settings,
  ) {}

  all(): Promise<WireTerminal[]> {
    return this.terminals('', []);
  }

  /** The terminal with a code, or null. */
  async find(code: string): Promise<WireTerminal | null> {
    const [terminal] = await this.terminals('WHERE t.code = ?', [code]);
    return terminal ?? null;
  }

  /** The terminal with a code, or a refusal with 404. */
  async require(code: string): Promise<WireTerminal> {
    const terminal = await this.find(code);
    if (terminal === null) throw unknownTerminal(code);
    return terminal;
  }

  async thresholdsOf(code: string): Promise<TerminalThresholds> {
    return (await this.settingsOf(code)).thresholds;
  }

  async settingsOf(code: string): Promise<WireTerminalSettings> {
    const kept = await this.settings.find<Partial<KeptSettings>>(code, THRESHOLDS);
    const { briefingRequired = false, ...thresholds } = kept?.value ?? {};
    return {
      terminal: code,
      version: kept?.version ?? 0,
      thresholds: { ...shippedThresholds, ...thresholds },
      briefingRequired,
      changedAt: kept === null ? null : formatInstant(kept.changedAt),
      changedBy: kept?.changedBy ?? null,
    };
  }

  private async terminals(where: string, parameters: unknown[]): Promise<WireTerminal[]> {
    const rows = await this.reader.query<TerminalTrackRow>(
      `SELECT t.id, t.version, t.code, t.name, t.zone, k.label, k.length_feet, k.cars, k.grade_percent, k.markers
       FROM terminal t LEFT JOIN track k ON k.terminal_id = t.id ${where} ORDER BY t.name, t.code, k.position`,
      parameters,
    );
    const terminals = new Map<string, WireTerminal>();
    for (const row of rows) {
      const { id, version, code, name, zone } = row;
      const terminal = terminals.get(code) ?? { id, version, code, name, zone, tracks: [] };
      if (row.label !== null) terminal.tracks.push(toWireTrack(row, row.label));
      terminals.set(code, terminal);
    }
    return [...terminals.values()];
  }
}

function toWireTrack(row: TerminalTrackRow, label: string): WireTrack {
  const markers = JSON.parse(row.markers ?? '[]') as StoppingMarker[];
  return {
    label,
    ...(row.length_feet === null ? {} : { lengthFeet: row.length_feet }),
    ...(row.cars === null ? {} : { cars: row.cars }),
    ...(row.grade_percent === null ? {} : { gradePercent: row.grade_percent }),
    ...(markers.length === 0 ? {} : { markers }),
  };
}
