/** A problem the person at the keyboard can understand and mend; shown as its sentence, without a stack. */
export class SetupProblem extends Error {}

/**
 * Prints one line for the person who started the command.
 * @param {string} text
 */
export function say(text) {
  process.stdout.write(`${text}\n`)
}

/**
 * Prints one line on the error stream.
 * @param {string} text
 */
export function complain(text) {
  process.stderr.write(`${text}\n`)
}

/**
 * Whole seconds since a moment, for progress lines.
 * @param {number} startedAtMs
 */
export function secondsSince(startedAtMs) {
  return `${((Date.now() - startedAtMs) / 1000).toFixed(1)} s`
}
