import { runService } from './run-service';

void runService(process.env);
