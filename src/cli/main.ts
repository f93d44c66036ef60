#!/usr/bin/env node
import { processIo } from './io.js';
import { runCommandLine } from './program.js';

// `boardcase schema | head` closes the pipe early; that is the reader's right.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
});
process.exitCode = await runCommandLine(process.argv.slice(2), processIo);
