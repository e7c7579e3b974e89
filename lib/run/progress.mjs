// Plain Node, no dependency: tells what takes long.
const QUIET_MS = 10_000;

export const say = (line) => console.log(line);
const seconds = (ms) => `${(ms / 1000).toFixed(ms < 10_000 ? 1 : 0)} s`;

/**
 * Says what begins, every ten seconds that it goes on, and how long it took.
 * @template T
 * @param {string} label
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(label, work) {
  const begun = Date.now();
  say(`${label} …`);
  const still = setInterval(() => say(`  ${label}: still at it, ${seconds(Date.now() - begun)}`), QUIET_MS);
  try {
    const result = await work();
    say(`  done in ${seconds(Date.now() - begun)}`);
    return result;
  } finally {
    clearInterval(still);
  }
}
