import { getDataSourceToken } from '@nestjs/typeorm';

/** Names of the two connections. */
export const WRITER_NAME = 'writer';
export const READER_NAME = 'reader';

/** Injection tokens of the two connections. Only the classes of this folder ask for them. */
export const WRITER = getDataSourceToken(WRITER_NAME);
export const READER = getDataSourceToken(READER_NAME);
