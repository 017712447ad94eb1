import { Injectable } from '@nestjs/common';
import { ROLES, type Role, type WireDemo } from '@stubpost/shared';
import { type SignedIn, SignInService } from '../auth/sign-in.service';
import { Refusal } from '../common/refusal';
import { Restarter } from '../common/restarter';
import { Config } from '../config/config';
import { pointAtNewDatabase } from '../database/database-file';
import { Installation } from '../database/installation';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';

/** How far the demo has been filled, in words for the sign-in page. */
export interface DemoProgress {
  state: 'filling' | 'ready';
  message: string;
}

/** One of the invented people, as the sign-in page offers them. */
export interface DemoPerson {
  id: string;
  name: string;
  role: Role;
  terminal: string;
}

/** What a demo shows of itself, one-click sign-in, and the way out of it. Who fills the demo reports its progress here. */
@Injectable()
export class DemoService {
  private progress: DemoProgress = { state: 'ready', message: '' };

  constructor(
    private readonly config: Config,
    private readonly installation: Installation,
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly signIns: SignInService,
    private readonly restarter: Restarter,
  ) {}

  /** Marks the database as a demo before anything is put into it. A second time changes nothing. */
  async begin(): Promise<void> {
    if (await this.installation.isDemo()) return;
    await this.unitOfWork.run((transaction) => this.installation.markAsDemo(transaction));
  }

  report(progress: DemoProgress): void {
    this.progress = progress;
  }

  async look(): Promise<WireDemo> {
    if (!(await this.installation.isDemo())) return { demo: false };
    return { demo: true, ...this.progress, people: await this.people() };
  }

  async signIn(personId: string, device: string): Promise<SignedIn> {
    await this.requireDemo();
    const offered = await this.people();
    if (!offered.some((person) => person.id === personId)) {
      throw new Refusal({ code: 'people.unknown', message: 'the demo does not offer this person' });
    }
    return this.signIns.openFor(personId, device);
  }

  /** Points the data folder at an empty database; the demo's own stays beside it. The caller then asks for a restart. */
  async leave(): Promise<void> {
    await this.requireDemo();
    pointAtNewDatabase(this.config.dataDir);
  }

  restart(): void {
    this.restarter.request();
  }

  /** One person of each role: the first who was added with it. */
  private async people(): Promise<DemoPerson[]> {
    const rows = await this.reader.query<DemoPerson>(
      `SELECT p.id, p.name, r.role, r.terminal FROM person p JOIN person_role r ON r.person_id = p.id
       WHERE p.active = ? ORDER BY p.created_at, p.email, r.terminal`,
      [true],
    );
    return ROLES.flatMap((role) => rows.find((row) => row.role === role) ?? []);
  }

  private async requireDemo(): Promise<void> {
    if (await this.installation.isDemo()) return;
    throw new Refusal({ code: 'demo.off', message: 'this is not a demo' });
  }
}
