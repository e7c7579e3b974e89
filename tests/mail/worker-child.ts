import { startMailWorker } from "@/lib/mail/worker";

// A server process reduced to its mail worker; the test kills it.
const worker = startMailWorker();
process.on("SIGTERM", () => void worker.stop().then(() => process.exit(0)));
process.send?.("started");
