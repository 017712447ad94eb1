import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import type { CookieOptions, Request, Response } from 'express';
import { Config } from '../config/config';

/**
 * The one cookie. Its name carries the port, because browsers share cookies between the ports of a host and several
 * installations may stand side by side on one.
 */
@Injectable()
export class SessionCookie {
  readonly name: string;
  private readonly options: CookieOptions;

  constructor(config: Config) {
    const url = new URL(config.publicUrl);
    const port = url.port || (config.isSecure ? '443' : '80');
    this.name = `${config.isSecure ? '__Host-' : ''}stubpost-${port}`;
    this.options = { httpOnly: true, sameSite: 'strict', secure: config.isSecure, path: '/' };
  }

  read(request: Request): string | null {
    const cookies = request.cookies as Record<string, unknown> | undefined;
    const value = cookies?.[this.name];
    return typeof value === 'string' ? value : null;
  }

  set(response: Response, token: string, endsAt: Instant): void {
    response.cookie(this.name, token, { ...this.options, expires: new Date(endsAt) });
  }

  clear(response: Response): void {
    response.clearCookie(this.name, this.options);
  }
}
