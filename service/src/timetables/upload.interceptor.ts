import {
  type CallHandler,
  type ExecutionContext,
  HttpException,
  Injectable,
  type NestInterceptor,
  PayloadTooLargeException,
} from '@nestjs/common';
import { catchError, type Observable, throwError } from 'rxjs';
import { Refusal } from '../common/refusal';
import { feedLimits, megabytes } from './feed-limits';

/** Says what was wrong with an upload in our own codes. Stands outside the interceptor that takes the file. */
@Injectable()
export class UploadRefusals implements NestInterceptor {
  intercept(_context: ExecutionContext, next: CallHandler): Observable<unknown> {
    return next.handle().pipe(catchError((error: unknown) => throwError(() => refusalFrom(error))));
  }
}

function refusalFrom(error: unknown): unknown {
  if (error instanceof PayloadTooLargeException) {
    const limit = megabytes(feedLimits.zipBytes);
    return new Refusal({
      code: 'timetable.too_large',
      message: `the file is larger than ${limit}`,
      facts: { limit, limitBytes: feedLimits.zipBytes },
    });
  }
  // What the form reader says is about the form, never about the file in it.
  if (error instanceof HttpException && error.getStatus() === 400) return fileMissing();
  return error;
}

/** The refusal for a form without a file in its field `file`. */
export function fileMissing(): Refusal {
  return new Refusal({ code: 'timetable.file_missing', message: 'send the zip as the form field "file"' });
}
