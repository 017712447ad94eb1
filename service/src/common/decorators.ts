import { createParamDecorator, type ExecutionContext, SetMetadata } from '@nestjs/common';
import type { Permission } from '@stubpost/shared';
import type { Request } from 'express';
import type { CurrentPersonFacts } from './signed-in';

/** Metadata keys the guard reads. */
export const PUBLIC_ROUTE = 'stubpost:public';
export const PERMITTED_ROUTE = 'stubpost:permit';

/** Where in the request the terminal's code stands: `query.terminal`, `param.code`, `body.terminal`. */
export type TerminalSource = `${'query' | 'param' | 'body'}.${string}`;

/** What a route asks of its caller. */
export interface RouteRule {
  permission: Permission;
  terminal?: TerminalSource | undefined;
}

/** The route answers anybody. */
export const Public = () => SetMetadata(PUBLIC_ROUTE, true);

/**
 * The route asks for a permission, at the terminal named in the request where one is given. A route whose terminal
 * is only known after loading leaves it out here and calls `Access.require` in its service.
 */
export const Permit = (permission: Permission, options: { terminal?: TerminalSource } = {}) =>
  SetMetadata(PERMITTED_ROUTE, { permission, terminal: options.terminal } satisfies RouteRule);

/** The signed-in person of a guarded route. */
export const CurrentPerson = createParamDecorator(
  (_: unknown, context: ExecutionContext): CurrentPersonFacts => {
    const person = context.switchToHttp().getRequest<Request & { user?: CurrentPersonFacts }>().user;
    if (person === undefined) throw new Error('CurrentPerson needs a route that asks for a permission');
    return person;
  },
);
