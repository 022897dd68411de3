// Loaded before the server: when the starting script dies, even by kill -9, the server ends too.
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
