import { Controller, Get, Header } from '@nestjs/common';
import { ROUTES } from '@stubpost/shared';
import { Public } from '../common/decorators';
import { Config } from '../config/config';
import { docsPage } from './docs-page';
import { openApiDocument } from './openapi';

/** The interface described: for programs and for people. */
@Controller('api')
export class DocsController {
  constructor(private readonly config: Config) {}

  @Get('openapi.json')
  @Public()
  document(): Record<string, unknown> {
    return openApiDocument(ROUTES, this.config.version);
  }

  @Get('docs')
  @Public()
  @Header('Content-Type', 'text/html; charset=utf-8')
  page(): string {
    return docsPage(ROUTES, this.config.version);
  }
}
