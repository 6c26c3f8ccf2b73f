/** Loaded into every child first: when the process that started it is gone, the child ends as if told to. */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
process.channel?.unref();
