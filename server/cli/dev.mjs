// `npm run dev`: as `npm start`, with hot reload of client and server.
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { serve } from './setup/serve.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const usualClientPort = 5173;
const clientPort = process.env.CLIENT_PORT || String(usualClientPort);
const clientAddress = `http://127.0.0.1:${clientPort}`;

/** @param {string} serverAddress */
function startClient(serverAddress) {
  const where = ['--host', '127.0.0.1', '--port', clientPort, '--strictPort'];
  const child = spawn(process.execPath, ['node_modules/vite/bin/vite.js', ...where], {
    cwd: projectDirectory,
    env: { ...process.env, API_PORT: new URL(serverAddress).port },
    stdio: ['ignore', 'inherit', 'inherit'],
    detached: true,
  });
  return { child, address: clientAddress };
}

await serve(projectDirectory, {
  buildClient: false,
  serverArguments: ['--watch', '--watch-preserve-output', '--import', 'tsx'],
  // Links in e-mails lead to the client that reloads.
  environment: { PUBLIC_URL: clientAddress },
  beside: startClient,
});
