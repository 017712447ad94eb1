import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module';
import { FirstAdministrator } from './first-administrator';
import { PeopleController } from './people.controller';
import { PeopleReadModel } from './people.read-model';
import { PeopleRepository } from './people.repository';
import { PeopleService } from './people.service';
import { SetupController } from './setup.controller';

/** People and their roles by terminal. */
@Module({
  imports: [AuthModule],
  controllers: [PeopleController, SetupController],
  providers: [FirstAdministrator, PeopleReadModel, PeopleRepository, PeopleService],
  exports: [PeopleReadModel, PeopleService],
})
export class PeopleModule {}
