/** Finding the browser that the journeys are tested in. */
import { installDebianPackages } from './debian.mjs';
import { findProgram, PlainError } from './process.mjs';

/** @returns {string | null} the program of an installed Chromium */
export function findChromium() {
  for (const name of ['chromium', 'chromium-browser', 'google-chrome']) {
    const program = findProgram(name);
    if (program) return program;
  }
  return null;
}

/**
 * Chromium, installed from the distribution when it is missing.
 * @param {(line: string) => void} say
 * @returns {Promise<string>}
 * @throws {PlainError} with the command to run when it can neither be found nor installed
 */
export async function requireChromium(say) {
  const reason = findChromium() ? null : await installDebianPackages(['chromium'], say);
  const program = findChromium();
  if (program) return program;
  throw new PlainError(
    `Chromium is missing${reason ? ` and could not be installed (${reason})` : ''}. ` +
      'Run "sudo apt-get install chromium" and try again.',
  );
}
