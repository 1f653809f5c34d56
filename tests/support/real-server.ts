import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath } from 'node:url';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url));

export interface RealServer {
  url: string;
  /** Ends the process and waits until it is gone. */
  kill: (signal: 'SIGKILL' | 'SIGTERM') => Promise<void>;
}

/** Starts the server as `npm start` does, in a process of its own on a port of its own. */
export async function startRealServer(environment: Record<string, string>): Promise<RealServer> {
  const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    cwd: projectDirectory,
    env: { ...process.env, HOST: '127.0.0.1', PORT: '0', LOG_LEVEL: 'error', ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const url = await addressOf(server);
  return {
    url,
    kill: async (signal) => {
      if (server.exitCode !== null || server.signalCode !== null) return;
      const gone = once(server, 'exit');
      server.kill(signal);
      await gone;
    },
  };
}

function addressOf(server: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let said = '';
    const hear = (part: Buffer) => {
      said += String(part);
      const found = /listening on (http:\S+)/.exec(said);
      if (found?.[1] !== undefined) resolve(found[1]);
    };
    server.stdout?.on('data', hear);
    server.stderr?.on('data', hear);
    server.once('exit', (code) => reject(new Error(`The server ended (${code}): ${said}`)));
  });
}
