// `npm run check-log -- FILE`: the checker as the build has made it, the very file that people take along.
import { existsSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { sayFailure, Failure } from './say.mjs';

const checker = inRoot('service/dist/check-log.mjs');
// npm moves to the top of the repository; a file is named as it is seen from where the command was given.
if (process.env.INIT_CWD !== undefined) process.chdir(process.env.INIT_CWD);

if (existsSync(checker)) await import(checker);
else {
  sayFailure(
    new Failure('NOT CHECKED. The checker is not built yet: run npm run build (or npm start) once.'),
  );
  process.exitCode = 2;
}
