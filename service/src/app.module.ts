import { type DynamicModule, Module } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { AlertsModule } from './alerts/alerts.module';
import { AuthModule } from './auth/auth.module';
import type { Clock } from './common/clock';
import { CommonModule } from './common/common.module';
import { LogModule } from './common/log.module';
import type { Config } from './config/config';
import { ConfigModule } from './config/config.module';
import { DatabaseModule } from './database/database.module';
import { DemoModule } from './demo/demo.module';
import { DocsModule } from './docs/docs.module';
import { ENTITIES } from './entities';
import { DutyModule } from './duty/duty.module';
import { HealthModule } from './health/health.module';
import { HistoryModule } from './history/history.module';
import { LiveModule } from './live/live.module';
import { MessagesModule } from './messages/messages.module';
import { PeopleModule } from './people/people.module';
import { PlansModule } from './plans/plans.module';
import { SetsModule } from './sets/sets.module';
import { TerminalsModule } from './terminals/terminals.module';
import { TimetablesModule } from './timetables/timetables.module';
import { TurnsModule } from './turns/turns.module';

/** The whole service: what everybody needs first, then one module per area. */
@Module({})
export class AppModule {
  static with(config: Config, clock: Clock): DynamicModule {
    return {
      module: AppModule,
      imports: [
        ConfigModule.withConfig(config),
        LogModule.forRequests(),
        ScheduleModule.forRoot(),
        CommonModule.withClock(clock),
        DatabaseModule.withEntities(ENTITIES),
        AuthModule,
        PeopleModule,
        TerminalsModule,
        PlansModule,
        SetsModule,
        TurnsModule,
        TimetablesModule,
        AlertsModule,
        DutyModule,
        MessagesModule,
        LiveModule,
        HistoryModule,
        HealthModule,
        DemoModule,
        DocsModule,
      ],
    };
  }
}
