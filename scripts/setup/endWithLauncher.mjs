/** Loaded into the server ahead of its own code: a launcher that was killed closes the channel, and it ends too. */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'))
// The channel alone is no reason to stay.
process.channel?.unref()
