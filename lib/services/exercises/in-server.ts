import { database } from "@/db/pool";
import { logger } from "@/lib/logger";
import { ensureLibrary } from "./library";

/** The library at the start of a server process. What goes wrong is logged: the server starts with the library it has. */
export async function ensureLibraryInServer(): Promise<void> {
  try {
    await ensureLibrary(database());
  } catch (error) {
    logger.error({ err: error }, "the exercise library was not brought up to date");
  }
}
