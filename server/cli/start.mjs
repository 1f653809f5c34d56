// `npm start`: from a fresh clone to a running product. Needs Node's own modules alone.
import { fileURLToPath } from 'node:url';
import { serve } from './setup/serve.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
await serve(projectDirectory, { buildClient: true, serverArguments: ['--import', 'tsx'] });
