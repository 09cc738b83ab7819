import { format } from 'node:util';

const levels = ['error', 'warn'] as const;

let heard: string[] = [];
let expected: RegExp[] = [];
let restore: (() => void)[] = [];

/** Begins listening to `console.error` and `console.warn` for one test. */
export function startConsoleWatch(): void {
  heard = [];
  expected = [];
  restore = levels.map((level) => {
    const original = console[level].bind(console);
    console[level] = (...parts: unknown[]) => {
      heard.push(`console.${level}: ${format(...parts)}`);
    };
    return () => {
      console[level] = original;
    };
  });
}

/** Says that this test is meant to make the console say something that matches `pattern`. */
export function expectConsole(pattern: RegExp): void {
  expected.push(pattern);
}

/** Ends the listening; throws when something was said that the test did not expect, or was not said. */
export function stopConsoleWatch(): void {
  for (const undo of restore) undo();
  restore = [];
  const surprises = heard.filter((line) => !expected.some((pattern) => pattern.test(line)));
  const silent = expected.filter((pattern) => !heard.some((line) => pattern.test(line)));
  if (surprises.length > 0) {
    throw new Error(`The console said something unexpected:\n${surprises.join('\n')}`);
  }
  if (silent.length > 0) {
    throw new Error(`The console was expected to say: ${silent.map(String).join(', ')}`);
  }
}
