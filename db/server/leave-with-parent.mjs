// Loaded into the app's process: when the command that started it is gone, even by kill -9, the app ends too and frees its port.
// The channel stays referenced: `next dev` loads this into its own child as well, which has nothing but the channel to wait for at first.
if (process.send) process.once("disconnect", () => process.kill(process.pid, "SIGTERM"));
