// Runs a command and says what went wrong with it; keeps its output for the message.
import { spawn, spawnSync } from 'node:child_process';

export class StepFailed extends Error {
  constructor(what, todo, output = '') {
    super(what);
    this.name = 'StepFailed';
    this.todo = todo;
    this.output = output;
  }
}

/** Resolves with the output; rejects with StepFailed. */
export function run(command, args, options = {}) {
  const { todo = 'Look at the output above.', ...rest } = options;
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...rest });
    let output = '';
    const keep = (chunk) => {
      output = (output + chunk.toString()).slice(-20_000);
    };
    child.stdout?.on('data', keep);
    child.stderr?.on('data', keep);
    child.on('error', (error) => reject(new StepFailed(`${command}: ${error.message}`, todo)));
    child.on('close', (code) => {
      if (code === 0) resolve(output);
      else reject(new StepFailed(`${command} ${args.join(' ')} ended with ${code}`, todo, output));
    });
  });
}

export const has = (command) => spawnSync('sh', ['-c', `command -v ${command}`]).status === 0;

export const isRoot = () => process.getuid?.() === 0;

/** Runs as another user: root for apt, postgres for the database server. */
export function asUser(user, command, args) {
  if (user === 'root') return isRoot() ? [command, args] : ['sudo', ['-n', command, ...args]];
  return isRoot() ? ['runuser', ['-u', user, '--', command, ...args]] : [command, args];
}
