import { existsSync } from 'node:fs';
import { statfs } from 'node:fs/promises';
import path from 'node:path';
import { SetupError } from './log.mjs';

const MB = 1e6;

// Measured on Debian 12, rounded up: node_modules 0.8 GB + npm's cache 0.4 GB; MariaDB with its packages 0.35 GB,
// Chromium 0.45 GB; a new database 0.15 GB; the built client and Metro's cache 0.15 GB.
export const NEEDS = {
  nodeModules: 1200 * MB,
  mariadb: 350 * MB,
  chromium: 450 * MB,
  database: 150 * MB,
  client: 150 * MB,
};

/** The sentence for too little free disk, or null when there is enough. */
export function diskSentence(needBytes, freeBytes, folder) {
  if (freeBytes >= needBytes) return null;
  const inGB = (bytes, round) => (round(bytes / 1e8) / 10).toFixed(1);
  return `Throughbond needs ${inGB(needBytes, Math.ceil)} GB of free disk for its set-up, but ${folder} has ${inGB(freeBytes, Math.floor)} GB left; free some space and start again.`;
}

function nearestExisting(folder) {
  let at = path.resolve(folder);
  while (!existsSync(at)) at = path.dirname(at);
  return at;
}

/** Stops the set-up with one sentence when the disk under the folder holds too little for the steps that are due. */
export async function checkDisk(folder, needBytes) {
  if (needBytes <= 0) return;
  const at = nearestExisting(folder);
  const { bavail, bsize } = await statfs(at);
  const sentence = diskSentence(needBytes, bavail * bsize, at);
  if (sentence) throw new SetupError(sentence);
}
