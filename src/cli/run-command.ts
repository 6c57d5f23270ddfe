/**
 * Runs one command of the command line: its answer goes to standard output; a failure is told in plain sentences
 * without a stack, and the process ends with 1.
 */
export async function runCommand(failure: string, work: () => Promise<string>): Promise<void> {
  try {
    console.log(await work());
  } catch (error) {
    console.error(`${failure}: ${messageOf(error)}`);
    process.exitCode = 1;
  }
}

/** Drizzle's own message quotes the whole statement; the driver's, below it, says what is wrong. */
function messageOf(error: unknown): string {
  let innermost = error;
  while (innermost instanceof Error && innermost.cause instanceof Error) innermost = innermost.cause;
  return innermost instanceof Error ? innermost.message : String(innermost);
}
