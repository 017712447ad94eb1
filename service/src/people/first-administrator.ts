import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { Config } from '../config/config';
import { PeopleReadModel } from './people.read-model';
import { PeopleService } from './people.service';

/** Makes the administrator named by the environment when nobody is there yet. */
@Injectable()
export class FirstAdministrator implements OnApplicationBootstrap {
  constructor(
    private readonly config: Config,
    private readonly people: PeopleService,
    private readonly readModel: PeopleReadModel,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    const wanted = this.config.firstAdministrator;
    if (wanted === null || (await this.readModel.isAnybodyThere())) return;
    await this.people.addFirstAdministrator({ ...wanted, name: 'Administrator' });
  }
}
