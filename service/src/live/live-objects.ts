import { Injectable } from '@nestjs/common';
import { wireAlertOf } from '../alerts/alert-record';
import { AlertReadModel } from '../alerts/alert.read-model';
import { Clock } from '../common/clock';
import { TurnFiles } from '../turns/turn-files';
import { TurnViews } from '../turns/turn-views';

/** The objects that live events carry, exactly as their own routes give them. */
@Injectable()
export class LiveObjects {
  constructor(
    private readonly files: TurnFiles,
    private readonly views: TurnViews,
    private readonly alerts: AlertReadModel,
    private readonly clock: Clock,
  ) {}

  /** The text of an object as it is now; null when it is not there any more. */
  async jsonOf(kind: 'turn' | 'alert', id: string): Promise<string | null> {
    if (kind === 'turn') {
      const file = await this.files.find(id);
      return file === null ? null : this.views.jsonOf(file, this.clock.now());
    }
    const alert = await this.alerts.find(id);
    return alert === null ? null : JSON.stringify(wireAlertOf(alert));
  }
}
