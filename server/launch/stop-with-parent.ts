/* Loaded into every child before its own code. When the start command is gone, even killed outright, the channel to it
   closes: the child then stops as if asked to, and outright if that takes too long. */
process.once("disconnect", () => {
  process.kill(process.pid, "SIGTERM");
  setTimeout(() => process.exit(1), 5000).unref();
});
process.channel?.unref();
