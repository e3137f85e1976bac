/** Starts the TypeScript module that a worker's data names. Plain JavaScript: a worker has no TypeScript until it has asked for it. */
import { fileURLToPath } from 'node:url';
import { workerData } from 'node:worker_threads';
import { register } from 'tsx/esm/api';

register({ tsconfig: fileURLToPath(new URL('../tsconfig.json', import.meta.url)) });
await import(workerData.module);
