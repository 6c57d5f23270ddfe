import process from 'node:process';
import { reportFailure } from './failure.mjs';
import { interruptRunning } from './processes.mjs';

/**
 * @typedef {object} Session
 * @property {(stop: () => Promise<void>) => void} onStop registers how to stop something; the last started stops first
 * @property {() => boolean} isStopping
 * @property {Promise<void>} stopRequested resolves on Ctrl-C, SIGTERM or a closed terminal
 */

/**
 * Runs the work of one command. However it ends (done, failed, Ctrl-C), everything it started is stopped, the last
 * first; a failure is one sentence and exit code 1.
 * @param {(session: Session) => Promise<number>} work resolves with the exit code
 */
export async function runSession(work) {
  /** @type {(() => Promise<void>)[]} */
  const stops = [];
  let isStopping = false;
  /** @type {() => void} */
  let requestStop = () => undefined;
  /** @type {Promise<void>} */
  const stopRequested = new Promise((resolve) => {
    requestStop = resolve;
  });
  const interrupt = () => {
    isStopping = true;
    interruptRunning();
    requestStop();
  };
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) process.on(signal, interrupt);

  let exitCode = 1;
  try {
    const session = {
      onStop: (/** @type {() => Promise<void>} */ stop) => void stops.push(stop),
      isStopping: () => isStopping,
      stopRequested,
    };
    // Whatever the work is waiting for, an interruption ends it.
    exitCode = await Promise.race([work(session), stopRequested.then(() => 0)]);
  } catch (error) {
    // What fails because it was interrupted is not a failure.
    if (isStopping) exitCode = 0;
    else reportFailure(error);
  }
  isStopping = true;
  for (const stop of stops.reverse()) {
    await stop().catch((error) => {
      reportFailure(error);
      exitCode = 1;
    });
  }
  process.exit(exitCode);
}
