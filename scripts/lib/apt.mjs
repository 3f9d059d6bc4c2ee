// Installs what is missing from Debian's packages.
import { asUser, has, isRoot, run, StepFailed } from './run.mjs';

let updated = false;

async function apt(args, todo) {
  const [command, all] = asUser('root', 'env', ['DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args]);
  await run(command, all, { todo });
}

/** @param {string[]} packages */
export async function install(packages) {
  const todo = `Install them by hand: sudo apt-get install ${packages.join(' ')}`;
  if (!has('apt-get')) throw new StepFailed('There is no apt-get here.', todo);
  if (!isRoot() && !has('sudo')) throw new StepFailed('Neither root nor sudo.', todo);
  if (!updated) {
    await apt(['update', '-qq'], todo);
    updated = true;
  }
  await apt(['install', '-y', '-qq', '--no-install-recommends', ...packages], todo);
}
