/** The way into a worker of `run-tasks.ts`. Plain JavaScript: a worker has no TypeScript until it has asked for it. */
import { fileURLToPath } from 'node:url';
import { register } from 'tsx/esm/api';

register({ tsconfig: fileURLToPath(new URL('../tsconfig.json', import.meta.url)) });
await import(new URL('./work.ts', import.meta.url).href);
