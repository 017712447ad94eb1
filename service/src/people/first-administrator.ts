import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { Config } from '../config/config';
import { Installation } from '../database/installation';
import { PeopleReadModel } from './people.read-model';
import { PeopleService } from './people.service';

/** Makes the administrator named by the environment when nobody is there yet. */
@Injectable()
export class FirstAdministrator implements OnApplicationBootstrap {
  constructor(
    private readonly config: Config,
    private readonly installation: Installation,
    private readonly people: PeopleService,
    private readonly readModel: PeopleReadModel,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    const wanted = this.config.firstAdministrator;
    if (wanted === null || (await this.readModel.isAnybodyThere())) return;
    // A database that is about to become a demo gets the demo's people, not ours.
    if (await this.installation.isDemoWanted()) return;
    await this.people.addFirstAdministrator({ ...wanted, name: 'Administrator' });
  }
}
