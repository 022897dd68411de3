import { readArguments, usage, UsageError } from './arguments.js';
import { evaluateFile } from './evaluate-file.js';

/**
 * Evaluates every file named and prints a JSON object a line.
 * @returns the exit code: 0 when every file was evaluated, 1 when one was not, 2 for a wrong call
 */
async function main(args: readonly string[], folder: string): Promise<number> {
  let asked;
  try {
    asked = readArguments(args);
  } catch (error) {
    if (error instanceof UsageError) {
      process.stderr.write(`${error.message}\n\n${usage}\n`);
      return 2;
    }
    throw error;
  }
  let code = 0;
  for (const file of asked.files) {
    const line = await evaluateFile(file, folder, asked, (error) => {
      process.stderr.write(`${file}: ${error instanceof Error ? error.stack : String(error)}\n`);
    });
    process.stdout.write(`${JSON.stringify(line)}\n`);
    code = line.ok ? code : 1;
  }
  return code;
}

// A reader that has seen enough (`| head`) closes the pipe: that is no failure.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  process.exit(error.code === 'EPIPE' ? 0 : 1);
});

process.exitCode = await main(
  process.argv.slice(2),
  process.env['HOLDFAST_CALLED_FROM'] ?? process.cwd(),
);
