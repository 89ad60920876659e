// Loaded before the server by `node --import`: where the process that started the server is killed outright, the server stops as if
// it had been asked to, and leaves neither its port taken nor a job half done.
process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'));
process.channel?.unref();
