import { fileURLToPath } from 'node:url';

export interface Environment {
  variables: Record<string, string | undefined>;
  projectDirectory: string;
}

/** What the process finds around itself. The only reader of process.env. */
export function readEnvironment(): Environment {
  const projectDirectory = fileURLToPath(new URL('../..', import.meta.url));
  return { variables: process.env, projectDirectory };
}
