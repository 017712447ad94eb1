import { Module } from '@nestjs/common';
import { TurnRepository } from './turn.repository';

/** The table of turns alone, for areas that a turn in its turn depends on. */
@Module({ providers: [TurnRepository], exports: [TurnRepository] })
export class TurnStoreModule {}
