/** `npm test`: every check, in the order in which it is cheapest to fail. */
const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
const isSupported = (major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22;

if (!isSupported) {
  console.error(
    `Slackwater needs Node.js 20.19 or newer, or 22.12 or newer; this is ${process.versions.node}.`,
  );
  process.exit(1);
}

const { runAllChecks } = await import('./support/checks.mjs');
process.exitCode = await runAllChecks();
