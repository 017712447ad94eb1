import { type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { AuthGuard } from '@nestjs/passport';
import { personHeader } from '@stubpost/shared';
import type { Request } from 'express';
import { Access } from '../common/access';
import { PERMITTED_ROUTE, PUBLIC_ROUTE, type RouteRule, type TerminalSource } from '../common/decorators';
import { Refusal } from '../common/refusal';
import type { CurrentPersonFacts } from '../common/signed-in';
import { SESSION_STRATEGY } from './session.strategy';

/** Stands before every route: what is neither public nor permitted to somebody is closed. */
@Injectable()
export class SessionGuard extends AuthGuard(SESSION_STRATEGY) {
  constructor(
    private readonly reflector: Reflector,
    private readonly access: Access,
  ) {
    super();
  }

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    const places = [context.getHandler(), context.getClass()];
    if (this.reflector.getAllAndOverride<boolean | undefined>(PUBLIC_ROUTE, places) === true) return true;
    const rule = this.reflector.getAllAndOverride<RouteRule | undefined>(PERMITTED_ROUTE, places);
    if (rule === undefined) {
      throw new Error(`${context.getClass().name}.${context.getHandler().name} names no permission`);
    }
    await super.canActivate(context);
    const request = context.switchToHttp().getRequest<Request & { user: CurrentPersonFacts }>();
    requireSamePerson(request);
    this.access.require(request.user, rule.permission, terminalIn(request, rule.terminal));
    return true;
  }

  override handleRequest<Person>(error: unknown, person: Person | false): Person {
    if (error instanceof Error) throw error;
    if (!person) throw new Refusal({ code: 'session.missing', message: 'nobody is signed in' });
    return person;
  }
}

/** A request that says whose it is must come with that person's session, not with the next one's on a shared phone. */
function requireSamePerson(request: Request & { user: CurrentPersonFacts }): void {
  const expected = request.get(personHeader);
  if (expected === undefined || expected === request.user.id) return;
  throw new Refusal({ code: 'session.other_person', message: 'somebody else is signed in' });
}

/** The terminal's code where the rule says it stands; a request without one is refused by its parser, not here. */
function terminalIn(request: Request, source: TerminalSource | undefined): string | undefined {
  if (source === undefined) return undefined;
  const [place, key] = source.split('.') as ['query' | 'param' | 'body', string];
  const holder = { query: request.query, param: request.params, body: request.body as unknown }[place];
  if (typeof holder !== 'object' || holder === null) return undefined;
  const value = (holder as Record<string, unknown>)[key];
  return typeof value === 'string' ? value.trim() : undefined;
}
