// Loaded before the app: when the starting process dies without a word (kill -9), the channel to it closes.
if (process.channel) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel.unref();
}
