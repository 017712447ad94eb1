import { Body, Controller, Get, Param, Post, Put } from '@nestjs/common';
import {
  type CreateTerminalRequest,
  createTerminalSchema,
  type ReplaceTracksRequest,
  replaceTracksSchema,
  type UpdateTerminalSettingsRequest,
  updateTerminalSettingsSchema,
  type WireTerminal,
  type WireTerminalSettings,
} from '@stubpost/shared';
import { CurrentPerson, Permit } from '../common/decorators';
import type { CurrentPersonFacts } from '../common/signed-in';
import { ZodPipe } from '../common/zod.pipe';
import { TerminalsReadModel } from './terminals.read-model';
import { TerminalsService } from './terminals.service';

/** Terminals, tracks, thresholds. */
@Controller('api/terminals')
export class TerminalsController {
  constructor(
    private readonly terminals: TerminalsService,
    private readonly readModel: TerminalsReadModel,
  ) {}

  @Get()
  @Permit('terminals.read')
  list(): Promise<WireTerminal[]> {
    return this.readModel.all();
  }

  @Post()
  @Permit('terminals.manage')
  async add(@Body(new ZodPipe(createTerminalSchema)) body: CreateTerminalRequest): Promise<WireTerminal> {
    await this.terminals.add(body);
    return this.readModel.require(body.code);
  }

  @Put(':code/tracks')
  @Permit('terminals.manage', { terminal: 'param.code' })
  async replaceTracks(
    @Param('code') code: string,
    @Body(new ZodPipe(replaceTracksSchema)) body: ReplaceTracksRequest,
  ): Promise<WireTerminal> {
    await this.terminals.replaceTracks(code, body);
    return this.readModel.require(code);
  }

  @Get(':code/settings')
  @Permit('settings.read', { terminal: 'param.code' })
  async settings(@Param('code') code: string): Promise<WireTerminalSettings> {
    await this.readModel.require(code);
    return this.readModel.settingsOf(code);
  }

  @Put(':code/settings')
  @Permit('settings.edit', { terminal: 'param.code' })
  async changeSettings(
    @Param('code') code: string,
    @Body(new ZodPipe(updateTerminalSettingsSchema)) body: UpdateTerminalSettingsRequest,
    @CurrentPerson() person: CurrentPersonFacts,
  ): Promise<WireTerminalSettings> {
    await this.terminals.changeSettings(code, body, person);
    return this.readModel.settingsOf(code);
  }
}
