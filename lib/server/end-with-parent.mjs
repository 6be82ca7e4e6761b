// Loaded before the server's and the worker's program: should the process that started them die without a word, they
// end in order all the same.
process.on("disconnect", () => process.kill(process.pid, "SIGTERM"));
process.channel?.unref();
