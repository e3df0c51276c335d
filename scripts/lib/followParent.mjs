// Loaded into the server (node --import): when the starter is gone, even by kill -9, the server stops in good order
// in place of holding its port for ever.
if (process.channel) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel.unref();
}
