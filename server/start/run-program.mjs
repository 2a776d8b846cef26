import { spawn } from 'node:child_process';

/**
 * Runs a program to its end and gives its code and all it said. Nothing is shown meanwhile.
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runProgram(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, {
      cwd: options.cwd,
      env: { ...process.env, ...options.env },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => (output += text));
    }
    child.once('error', (error) => resolve({ code: 127, output: error.message }));
    child.once('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/**
 * The last lines of a program's output, for a message.
 * @param {string} output
 * @param {number} [count]
 * @returns {string}
 */
export function lastLines(output, count = 12) {
  return output.trimEnd().split('\n').slice(-count).join('\n');
}
