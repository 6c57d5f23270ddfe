import process from 'node:process';

/** Something the person at the terminal can put right: its message is the whole explanation, in one sentence. */
export class SetupFailure extends Error {}

const fileProblems = new Map([
  ['ENOSPC', 'the disk is full'],
  ['EDQUOT', 'the disk quota is used up'],
  ['EACCES', 'this user may not write there'],
  ['EPERM', 'this user may not write there'],
  ['EROFS', 'the disk is mounted read-only'],
  ['ENOTDIR', 'a part of the path is a file, not a folder'],
  ['EEXIST', 'a file stands where a folder is needed'],
  ['ENOENT', 'the folder cannot be made there'],
  ['ENAMETOOLONG', 'the path is too long'],
]);

/**
 * The `code` of a Node or PostgreSQL error, or '' where there is none.
 * @param {unknown} error
 * @returns {string}
 */
export function errorCode(error) {
  return error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : '';
}

/**
 * @param {unknown} error
 * @returns {string}
 */
export function errorMessage(error) {
  return error instanceof Error ? error.message : String(error);
}

/**
 * Turns a file-system error into a sentence that names the path and the remedy.
 * @param {unknown} error
 * @param {string} path
 * @returns {SetupFailure}
 */
export function fileFailure(error, path) {
  if (error instanceof SetupFailure) return error;
  const code = errorCode(error);
  const problem = fileProblems.get(code) ?? errorMessage(error);
  const remedy =
    code === 'ENOSPC' || code === 'EDQUOT'
      ? 'free some space, or set WL_DATA_DIR to a folder on another disk'
      : 'set WL_DATA_DIR to a folder this user may write to';
  return new SetupFailure(`Cannot write to ${path}: ${problem}; ${remedy}.`);
}

/**
 * Whether the output of a program says that the disk is full.
 * @param {string} output
 * @returns {boolean}
 */
export function saysDiskFull(output) {
  return /ENOSPC|EDQUOT|No space left on device|Disk quota exceeded/i.test(output);
}

/**
 * The last line that tells a person something: no stack frame, no blank line, no bare bracket.
 * @param {string} output
 * @returns {string}
 */
export function lastTellingLine(output) {
  const lines = output
    .replaceAll(/\u001b\[[0-9;]*m/g, '')
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => /[\p{L}\p{N}]{2}/u.test(line))
    .filter((line) => !/^at .*[:)]|^at \S+$|^node:internal|^Node\.js v\d/.test(line));
  return lines.at(-1) ?? 'it printed nothing';
}

/**
 * Ends the process with one sentence on standard error and no stack trace.
 * @param {unknown} error
 */
export function reportFailure(error) {
  const sentence =
    error instanceof SetupFailure
      ? error.message
      : errorCode(error) === 'ENOSPC'
        ? fileFailure(error, process.cwd()).message
        : `Wanderlength stopped on something unforeseen: ${errorMessage(error)}`;
  process.stderr.write(`${sentence}\n`);
  if (process.env.WL_DEBUG && error instanceof Error) process.stderr.write(`${error.stack ?? ''}\n`);
}

/** @param {string} line */
export function say(line) {
  process.stdout.write(`${line}\n`);
}
