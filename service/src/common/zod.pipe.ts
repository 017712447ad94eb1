import { Injectable, type PipeTransform } from '@nestjs/common';
import type { z } from 'zod';
import { Refusal } from './refusal';

/**
 * Turns a body, a query or a path parameter into trusted data by a schema of the contract, or refuses it with
 * every place that is wrong. `@Body(new ZodPipe(signInSchema)) request: SignInRequest`.
 */
@Injectable()
export class ZodPipe<Schema extends z.ZodType> implements PipeTransform<unknown, z.output<Schema>> {
  constructor(private readonly schema: Schema) {}

  transform(value: unknown): z.output<Schema> {
    const parsed = this.schema.safeParse(value ?? {});
    if (parsed.success) return parsed.data;
    const problems = parsed.error.issues.map((issue) => ({
      path: issue.path.join('.'),
      message: issue.message,
    }));
    const first = problems[0];
    throw new Refusal({
      code: 'request.invalid',
      message:
        first === undefined ? 'the request is not valid' : `${first.path || 'request'}: ${first.message}`,
      facts: { problems },
    });
  }
}
