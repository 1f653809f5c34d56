// `npm run dev`: as `npm start`, with hot reload of client and server.
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { serve } from './setup/serve.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const clientPort = Number(process.env.CLIENT_PORT ?? 5173);
await serve(projectDirectory, {
  buildClient: false,
  serverArguments: ['--watch', '--watch-preserve-output', '--import', 'tsx'],
  address: `http://127.0.0.1:${clientPort}`,
  beside: (port) =>
    spawn(
      process.execPath,
      [
        'node_modules/vite/bin/vite.js',
        '--host',
        '127.0.0.1',
        '--port',
        String(clientPort),
        '--strictPort',
      ],
      {
        cwd: projectDirectory,
        env: { ...process.env, API_PORT: String(port) },
        stdio: ['ignore', 'inherit', 'inherit'],
        detached: true,
      },
    ),
});
