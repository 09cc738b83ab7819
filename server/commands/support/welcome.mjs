/** What a person reads when everything is up. */
const demoPassword = 'slack-water-demo';
const demoPeople = ['owner', 'assistant', 'client', 'adviser'];

/**
 * @param {string} address
 * @param {import('./settings.mjs').Settings} settings
 * @param {boolean} isProduction
 * @param {boolean} showsEverything
 */
export function describeWelcome(address, settings, isProduction, showsEverything) {
  const lines = ['', `Slackwater is ready: ${address}`];
  if (!isProduction) {
    lines.push(`Demo sign-ins, all with the password ${demoPassword}:`);
    for (const person of demoPeople) lines.push(`  ${person}@demo.example`);
  }
  if (settings.smtpUrl) {
    lines.push(`Mail is caught, not sent; read it at http://127.0.0.1:${settings.mailPagePort}/`);
  }
  if (!showsEverything) lines.push('Logs are in .data/logs.');
  lines.push('Ctrl-C stops everything.', '');
  return lines.join('\n');
}
