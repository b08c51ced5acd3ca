#!/usr/bin/env node
import { EXIT_CODE } from '../shared/index.ts';
import { run } from './program.ts';

// A reader that has seen enough (`| head`) is no trouble; a full disk behind `>` is.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code === 'EPIPE') return;
  process.stderr.write(`The output could not be written: ${error.code ?? error.message}\n`);
  process.exitCode = EXIT_CODE.output;
});
process.stderr.on('error', () => undefined);

const code = await run(process.argv.slice(2), {
  cwd: process.cwd(),
  debug: (process.env.TRACKWORTH_DEBUG ?? '') !== '',
  out: (text) => process.stdout.write(text),
  err: (text) => process.stderr.write(text),
});
// Never process.exit(): it would cut off what a pipe has not taken yet.
process.exitCode ||= code;
