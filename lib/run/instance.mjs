// Plain Node, no dependency: one running Bellward a checkout, remembered in .data/run.json.
import { existsSync, readFileSync, rmSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";
import { isAlive, portIsFree } from "../../db/server-ports.mjs";
import { killGroup, SetupError } from "./command.mjs";
import { inData, writeWhole } from "./project.mjs";

const FILE = inData("run.json");

/** Number that tells a process from a later one with the same id: when it began, in clock ticks since boot. */
function birthOf(pid) {
  if (!isAlive(pid)) return null;
  const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
  return stat.slice(stat.lastIndexOf(")") + 2).split(" ")[19] ?? null;
}

const isStill = ({ pid, birth }) => birth !== null && birthOf(pid) === birth;

function remembered() {
  if (!existsSync(FILE)) return null;
  try {
    return JSON.parse(readFileSync(FILE, "utf8"));
  } catch {
    return null;
  }
}

/** The start that is going on in this checkout, or null. */
export function runningInstance() {
  const run = remembered();
  return run && isStill(run) ? run : null;
}

/** Refuses a second start of one checkout, and ends what a killed one left behind. */
export async function claimInstance(address) {
  const run = remembered();
  if (run && isStill(run))
    throw new SetupError(
      `already started from here: ${run.address} (process ${run.pid}); stop that one first`,
    );
  for (const child of run?.children ?? []) {
    if (isStill(child)) killGroup(child.pid, "SIGKILL");
    // Its port is free only when it is gone.
    while (isStill(child)) await pause(20);
  }
  rememberInstance(address, []);
}

export function rememberInstance(address, children) {
  const own = { pid: process.pid, birth: birthOf(process.pid), address };
  writeWhole(
    FILE,
    `${JSON.stringify({ ...own, children: children.map(({ pid }) => ({ pid, birth: birthOf(pid) })) })}\n`,
  );
}

export function forgetInstance() {
  if (remembered()?.pid === process.pid) rmSync(FILE, { force: true });
}

/** PORT, checked: a number, and free on 127.0.0.1. */
export function wantedPort() {
  const port = Number(process.env.PORT || 3000);
  if (!Number.isInteger(port) || port < 1 || port > 65_535)
    throw new SetupError(`PORT must be a number from 1 to 65535, not "${process.env.PORT}"`);
  return port;
}

export async function refuseTakenPort(port) {
  if (await portIsFree(port)) return;
  throw new SetupError(
    `port ${port} on 127.0.0.1 is taken by another program; choose one with PORT=${port === 3000 ? 3100 : port + 1} npm start`,
  );
}
