import { logger } from "@/lib/logger";
import { startMailWorker, type MailWorker } from "./worker";

/** Milliseconds that jobs in hand get on shutdown; a mail that takes longer is sent by the next process. */
const STOP_MS = 12_000;

declare global {
  /** Once a process, also when a development server loads its modules again. */
  var bellwardMailWorker: MailWorker | undefined;
}

/**
 * Starts the mail worker in this server process and stops it on SIGTERM and SIGINT before the process ends. The latter only
 * with NEXT_MANUAL_SIG_HANDLE, without which Next ends the process at once; mail in hand is then sent by the next process.
 */
export function runMailWorkerInServer(): void {
  if (globalThis.bellwardMailWorker) return;
  const worker = startMailWorker();
  globalThis.bellwardMailWorker = worker;
  if (!process.env.NEXT_MANUAL_SIG_HANDLE) return;
  let stopping = false;
  const stop = (): void => {
    if (stopping) return;
    stopping = true;
    setTimeout(() => process.exit(0), STOP_MS).unref();
    worker
      .stop()
      .catch((error: unknown) => logger.error({ err: error }, "the mail worker did not stop cleanly"))
      .finally(() => process.exit(0));
  };
  process.on("SIGTERM", stop);
  process.on("SIGINT", stop);
}
