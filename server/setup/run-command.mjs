import { spawn } from 'node:child_process';

/**
 * Runs a command to its end. Output is kept and shown only when it fails, unless `show`.
 * Rejects with the output's last lines when the exit code is not 0.
 */
export function runCommand(command, args, { show = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: ['ignore', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'],
      ...options,
    });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', reject);
    child.on('close', (code, signal) => {
      if (code === 0) resolve(output);
      else
        reject(
          new Error(
            `${command} ${args.join(' ')} ended with ${signal ?? code}.\n${output.split('\n').slice(-25).join('\n')}`,
          ),
        );
    });
  });
}
