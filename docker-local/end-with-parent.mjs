// Loaded before the app: when the starting process dies without a word (kill -9), the channel to it closes.
// Processes that the app itself starts inherit this file, but not this parent.
if (process.channel && process.env.HEARTCUT_STARTED_BY === String(process.ppid)) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
}
