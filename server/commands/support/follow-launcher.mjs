/**
 * Loaded before a child of the launcher: when the launcher is gone, however it went, the child
 * stops as if it had been asked to.
 */
if (process.channel) {
  process.once('disconnect', () => {
    process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.exit(1), 30_000).unref();
  });
  // Waiting for the launcher must not keep a finished process alive.
  process.channel.unref();
}
