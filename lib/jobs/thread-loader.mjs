// The first file of every thread: makes the thread understand TypeScript, then loads its module. Given on the command line, `--import tsx`
// would only reach threads of a process that was itself started through tsx, which the test runner is not.
import { workerData } from 'node:worker_threads';

import { register } from 'tsx/esm/api';

register();
await import(workerData.module);
