// Loaded into the app's process: when the command that started it is gone, even by kill -9, the app ends too and frees its port.
if (process.send) {
  process.once("disconnect", () => process.kill(process.pid, "SIGTERM"));
  process.channel?.unref();
}
