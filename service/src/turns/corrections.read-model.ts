import { Injectable } from '@nestjs/common';
import {
  type CorrectionsQuery,
  type ListedCorrection,
  type WireCorrection,
  turnMattersOf,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { TurnFile } from './turn-file';
import { TurnFiles, type TurnVersion } from './turn-files';

/** Changes of the record that need an approval, from all turns of a terminal. */
@Injectable()
export class CorrectionsReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly files: TurnFiles,
  ) {}

  /** The latest asked for first. */
  async find({ terminal, state }: CorrectionsQuery): Promise<ListedCorrection[]> {
    const least = state === 'waiting' ? 1 : 0;
    const turns = await this.reader.query<TurnVersion>(
      'SELECT id, version FROM turn WHERE terminal_code = ? AND correction_count > 0 AND waiting_count >= ?',
      [terminal, least],
    );
    const files = await this.files.findAll(turns);
    return [...files.values()]
      .flatMap((file) => correctionsOf(file))
      .filter((correction) => state === 'all' || correction.state === 'waiting')
      .sort((a, b) => b.askedAt.localeCompare(a.askedAt) || a.entryId.localeCompare(b.entryId));
  }
}

function correctionsOf(file: TurnFile): ListedCorrection[] {
  const { corrections = [] } = turnMattersOf(file.facts);
  return corrections.map((correction) => listedOf(correction, file));
}

function listedOf(correction: WireCorrection, { record, facts }: TurnFile): ListedCorrection {
  const step = facts.steps.find((each) => each.key === correction.what);
  return {
    ...correction,
    turnId: record.id,
    terminal: record.terminalCode,
    zone: record.zone,
    serviceDate: record.serviceDate,
    track: facts.track,
    inboundTrain: record.inboundTrain,
    outboundTrain: record.outboundTrain,
    whatLabel: step?.shortLabel ?? inWords(correction.what),
  };
}

function inWords(token: string): string {
  const words = token.replaceAll('-', ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
