// Loaded before the server when a command of ours starts it: however that command ended, even by kill -9, its end of the channel
// closes, and a server that nobody can end any more would otherwise keep its port and its database sessions.
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
// Listening alone must not keep a server alive that has finished.
process.channel?.unref();
