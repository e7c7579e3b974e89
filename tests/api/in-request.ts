// First of all: Next keeps the request in hand in a global that its server sets up before anything else.
import "next/dist/server/node-environment-baseline";
import { RequestCookies } from "next/dist/compiled/@edge-runtime/cookies";
import { workAsyncStorage } from "next/dist/server/app-render/work-async-storage.external";
import { workUnitAsyncStorage } from "next/dist/server/app-render/work-unit-async-storage.external";

/**
 * Runs a route handler as Next's server does: next-auth asks Next for the headers and cookies of the request in hand, and
 * outside of a request there are none.
 */
export function inRequest<T>(request: Request, work: () => Promise<T>): Promise<T> {
  const { headers } = request;
  const unit = { type: "request", phase: "render", headers, cookies: new RequestCookies(headers) };
  const store = { route: new URL(request.url).pathname };
  type Work = Parameters<typeof workAsyncStorage.run>[0];
  type Unit = Parameters<typeof workUnitAsyncStorage.run>[0];
  return workAsyncStorage.run(store as Work, () => workUnitAsyncStorage.run(unit as unknown as Unit, work));
}
