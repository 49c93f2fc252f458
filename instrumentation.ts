/** Runs once when a server process starts, before the first request is answered. */
export async function register(): Promise<void> {
  // Also compiled for another runtime, which has no files and no database.
  if (process.env.NEXT_RUNTIME !== "nodejs") return;

  const { prepareServer } = await import("./instrumentation-node");
  await prepareServer();
}
