/**
 * Loaded into the processes that a start has: when their parent dies without a word (kill -9), the
 * channel to it closes, and they stop as if asked to, instead of holding the port and the database.
 */
if (process.channel !== undefined) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel.unref();
}
