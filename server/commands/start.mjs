/**
 * `npm start` and `npm run dev`. Plain JavaScript that an old Node.js can read too, so that it can
 * say what is missing; everything else is loaded after that.
 */
const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
const isSupported = (major === 20 && minor >= 19) || (major === 22 && minor >= 12) || major > 22;

if (!isSupported) {
  console.error(
    `Slackwater needs Node.js 20.19 or newer, or 22.12 or newer; this is ${process.versions.node}.`,
  );
  process.exit(1);
}

const unknown = process.argv.slice(2).filter((argument) => argument !== '--dev');
if (unknown.length > 0) {
  console.error(`Unknown option ${unknown.join(' ')}. There is only --dev.`);
  process.exit(1);
}

const { launch } = await import('./support/launch.mjs');
await launch({ isDevelopment: process.argv.includes('--dev') });
