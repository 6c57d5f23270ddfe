import process from 'node:process';
import { reportFailure } from './failure.mjs';
import { interruptRunning } from './processes.mjs';

/** @typedef {(stop: () => Promise<void>) => void} OnStop */

/**
 * Runs a script's work and, however it ends, stops what it started in the reverse order. Ctrl-C, SIGTERM and a closed
 * terminal end it in the same orderly way; pressing again changes nothing, since the second press would cut short
 * the first.
 * @param {(onStop: OnStop, markReady: () => void) => Promise<number>} work resolves with the exit status;
 *   interrupted after markReady() the status is 0, before it 130
 */
export async function runSession(work) {
  /** @type {(() => Promise<void>)[]} */
  const stops = [];
  let isReady = false;
  let isInterrupted = false;
  /** @type {Promise<number>} */
  const interruption = new Promise((resolve) => {
    for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
      process.on(signal, () => {
        isInterrupted = true;
        interruptRunning();
        resolve(isReady ? 0 : 130);
      });
    }
  });
  // The terminal or the pipe that reads us may be gone before we are.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

  let status = 1;
  try {
    const onStop = (/** @type {() => Promise<void>} */ stop) => void stops.push(stop);
    const markReady = () => {
      isReady = true;
    };
    status = await Promise.race([work(onStop, markReady), interruption]);
  } catch (error) {
    // What fails because it was interrupted is not a failure of its own.
    if (isInterrupted) status = await interruption;
    else reportFailure(error);
  }
  for (const stop of stops.reverse()) {
    await stop().catch((error) => {
      reportFailure(error);
      status = 1;
    });
  }
  // Output to a pipe is written in the background: leave once it is out.
  process.stdout.write('', () => process.stderr.write('', () => process.exit(status)));
}
