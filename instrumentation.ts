/** Called by Next once per server process, before the first request. */
export async function register(): Promise<void> {
  // The condition stands alone and inline: it keeps Node's modules out of the edge bundle.
  if (process.env.NEXT_RUNTIME === "nodejs") {
    const { ensureLibraryInServer } = await import("./lib/services/exercises/in-server");
    await ensureLibraryInServer();
    const { runMailWorkerInServer } = await import("./lib/mail/in-server");
    runMailWorkerInServer();
  }
}
