/** A failure the person can act on: printed without a stack. */
export class Advice extends Error {}

const startedAt = Date.now();

/** One line of progress on stderr, with seconds since the command began. */
export function say(text) {
  const seconds = ((Date.now() - startedAt) / 1000).toFixed(1).padStart(5);
  process.stderr.write(`${seconds} s  ${text}\n`);
}

function explain(error) {
  if (error instanceof Advice) {
    return error.message;
  }
  if (error?.code === 'EACCES') {
    return (
      `${error.path} belongs to another user. Run this as the user who ran it here first,\n` +
      'or remove the .data folder (with its database) and start anew.'
    );
  }
  return error?.stack ?? String(error);
}

/** Runs a script's main function; advice is printed plainly, anything else with its stack. */
export async function main(run) {
  try {
    await run();
  } catch (error) {
    process.stderr.write(`\n${explain(error)}\n`);
    process.exitCode = 1;
  }
}
