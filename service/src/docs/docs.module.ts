import { Module } from '@nestjs/common';
import { DocsController } from './docs.controller';

/** Describes the interface from the table of routes. */
@Module({ controllers: [DocsController] })
export class DocsModule {}
