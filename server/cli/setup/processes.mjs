import { readdirSync, readFileSync, readlinkSync } from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';

/** @param {number} pid */
export function isRunning(pid) {
  try {
    process.kill(pid, 0);
    return !isZombie(pid);
  } catch (error) {
    // Somebody else's process may not be signalled, but is there.
    return /** @type {{ code?: string }} */ (error).code === 'EPERM';
  }
}

/** Ended, and only waiting for a parent that does not ask. @param {number} pid */
function isZombie(pid) {
  try {
    return /^State:\s+Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'));
  } catch {
    return false;
  }
}

/** The words a process was started with; none where it is gone or not ours to see. @param {number} pid @returns {string[]} */
export function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').filter(Boolean);
  } catch {
    return [];
  }
}

/** @param {number} pid @returns {string | null} */
export function workingFolder(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch {
    return null;
  }
}

/**
 * Processes by the words they were started with. A pid kept in a file may long be another program's.
 *
 * @param {(words: string[], pid: number) => boolean} wanted
 * @returns {number[]}
 */
export function findProcesses(wanted) {
  /** @type {string[]} */
  let entries = [];
  try {
    entries = readdirSync('/proc');
  } catch {
    return [];
  }
  return entries
    .filter((entry) => /^\d+$/.test(entry))
    .map(Number)
    .filter((pid) => pid !== process.pid && wanted(commandLine(pid), pid));
}

/**
 * Asks a process to end and waits until it has.
 *
 * @param {number} pid
 * @param {number} patienceMs
 * @returns {Promise<boolean>} whether it is gone
 */
export async function endProcess(pid, patienceMs) {
  if (pid <= 0 || !isRunning(pid)) return true;
  try {
    process.kill(pid, 'SIGTERM');
  } catch {
    return !isRunning(pid);
  }
  const until = Date.now() + patienceMs;
  while (isRunning(pid) && Date.now() < until) await sleep(25);
  return !isRunning(pid);
}
