/** `npm run proof -- [EXERCISE] --seeds N --from-seed K`: proves one exercise, or all of content/. */
import { proof } from './proof-command';

process.exitCode = await proof(process.argv.slice(2));
