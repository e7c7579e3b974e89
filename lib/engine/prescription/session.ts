import { ITEMS, type Lift, type Reason } from "../types";
import { leanOf } from "./base-weights";
import type { Block } from "./blocks";
import { aimIn, inTurn, isEarly, type Candidate, type Moment } from "./choose";
import { whyNot } from "./empty";
import type { Exercise, Quality } from "./exercise";
import type { Library } from "./library";
import { lineOf, type Filled } from "./line";
import { bestOn, heavyRow, heavySets } from "./loads";
import { splitSets, type Claim } from "./sets";
import { slotsOf, WORK, type Slot } from "./slots";
import type { EmptySlot, Line, LineEdit, PrescribedLift } from "./types";
import { warmUpOf } from "./warm-up";

/** Alternatives of a line, at most. */
const ALTERNATIVES = 8;

/** The coach's choice for a slot where it stands, or why it does not. */
type Wish = { readonly filled: Filled } | { readonly refused: Reason } | null;

function wishOf(slot: Slot, edit: LineEdit | undefined, library: Library): Wish {
  if (edit?.exercise === undefined) return null;
  const exercise = library.byId.get(edit.exercise);
  const aim = exercise ? aimIn(slot, exercise) : null;
  if (!exercise || !aim) {
    return { refused: { rule: "edit", text: "What the coach chose is not in the library any more." } };
  }
  const why = whyNot(exercise, library);
  if (why !== "") {
    return { refused: { rule: "edit", text: `The coach chose ${exercise.name}, but ${why}.` } };
  }
  const reasons: Reason[] = [{ rule: "edit", text: "Chosen by the coach." }];
  return { filled: { slot, exercise, aim, tier: 0, reasons, chosenByCoach: true } };
}

/** One session while its slots are filled. */
class Session {
  private readonly wishes: ReadonlyMap<string, Wish>;
  private readonly used = new Set<string>();
  private readonly usedQualities = new Set<Quality>();
  private readonly moment: Moment;

  constructor(
    private readonly lift: Lift,
    private readonly slots: readonly Slot[],
    edits: Readonly<Record<string, LineEdit>>,
    private readonly library: Library,
    block: Block,
  ) {
    this.wishes = new Map(slots.map((slot) => [slot.id, wishOf(slot, edits[slot.id], library)]));
    // What the coach chose anywhere in the session is not chosen again by another slot before it.
    for (const wish of this.wishes.values()) if (wish && "filled" in wish) this.use(wish.filled.exercise);
    this.moment = {
      item: lift.item,
      week: lift.week,
      block,
      shift: ITEMS.indexOf(lift.item),
      used: this.used,
      usedQualities: this.usedQualities,
      known: (exercise) => bestOn(library.bests, exercise, block.from) !== null,
    };
  }

  private use(exercise: Exercise): void {
    this.used.add(exercise.id);
    this.usedQualities.add(exercise.qualities[0]);
  }

  /** What goes into a slot; null where nothing may. */
  fill(slot: Slot): Filled | null {
    const wish = this.wishes.get(slot.id) ?? null;
    if (wish && "filled" in wish) return wish.filled;
    const early = isEarly(this.lift.phase);
    const { candidates, turns } = this.library.ranked(this.lift.item, slot, early);
    const place = this.slots.indexOf(slot);
    for (const candidate of inTurn(slot, candidates, turns, place, this.moment)) {
      const filled = this.swapped(slot, candidate);
      if (this.used.has(filled.exercise.id)) continue;
      this.use(filled.exercise);
      return wish ? { ...filled, reasons: [wish.refused, ...filled.reasons] } : filled;
    }
    return null;
  }

  /** A swap of the camp stands in for the turn, where it may be done. */
  private swapped(slot: Slot, { exercise: from, aim, tier }: Candidate): Filled {
    const to = this.library.swapFor(this.lift.item, from);
    const toAim = to && aimIn(slot, to);
    if (!to || !toAim) return { slot, exercise: from, aim, tier, reasons: [], chosenByCoach: false };
    const reasons = [{ rule: "swap", text: `Instead of ${from.name}, as chosen for this camp.` }];
    return { slot, exercise: to, aim: toAim, tier, reasons, chosenByCoach: false };
  }
}

/** Sets that are still worth doing for something other than heavy work: common practice, no published source. */
const LEAST = 2;

function claimOf({ exercise, aim }: Filled, share: number, lift: Lift, kept: boolean): Claim {
  const own = exercise.doses[aim]?.sets ?? { low: 1, high: 1 };
  const row = aim === "heavy" ? heavyRow(lift.intensity) : null;
  if (!row) {
    return { share, low: own.low, high: own.high, least: Math.min(LEAST, own.low), most: Infinity, kept };
  }
  const inside = heavySets(row);
  const low = Math.max(inside.low, Math.min(own.low, inside.high));
  const high = Math.max(low, Math.min(own.high, inside.high));
  return { share, low, high, least: inside.low, most: inside.high, kept };
}

interface Opened {
  readonly filled: readonly Filled[];
  readonly sets: readonly number[];
  readonly empty: readonly EmptySlot[];
}

/** Fills the slots and parts the sets; extra slots open one by one while the sets are more than the others take. */
function open(lift: Lift, edits: Readonly<Record<string, LineEdit>>, library: Library, block: Block): Opened {
  const slots = slotsOf(lift.item);
  const session = new Session(lift, slots, edits, library, block);
  const filled: Filled[] = [];
  const claims: Claim[] = [];
  const empty: EmptySlot[] = [];
  const add = (slot: Slot) => {
    const one = session.fill(slot);
    if (!one) {
      if (!slot.extra) empty.push(library.emptyOf(slot));
      return;
    }
    filled.push(one);
    const lean = slot.byBase && !slot.stays ? leanOf(slot.wanted, library.weights) : 1;
    claims.push(claimOf(one, slot.share * lean, lift, edits[slot.id] !== undefined));
  };
  const closed: Slot[] = [];
  for (const slot of slots) {
    if (slot.extra && edits[slot.id] === undefined) closed.push(slot);
    else add(slot);
  }
  let split = splitSets(lift.sets, claims);
  for (const slot of closed) {
    if (split.above === 0) break;
    add(slot);
    split = splitSets(lift.sets, claims);
  }
  if (split.left > 0 && filled.length > 0) {
    const why = `${split.left} of the session's sets stay open: more heavy lifts would leave the lift-count table.`;
    empty.push({ slot: "open-sets", purpose: "Sets without an exercise", why });
  }
  return { filled, sets: split.sets, empty };
}

/** Fast first, then heavy, accessories, trunk; what tires the rest stands at the end. */
const placeOf = ({ slot, exercise, aim }: Filled): number =>
  exercise.order === "last" ? WORK.length : aim === "fast" ? WORK.indexOf("fast") : WORK.indexOf(slot.work);

/** Prescription of one lifting session. */
export function prescribeLift(lift: Lift, library: Library, block: Block): PrescribedLift {
  const edit = library.edits[lift.id];
  const edits = edit?.lines ?? {};
  const { filled, sets, empty } = open(lift, edits, library, block);
  const rows = filled
    .map((one, index) => ({ one, sets: Math.max(sets[index] ?? 0, edits[one.slot.id] ? 1 : 0) }))
    .filter((row) => row.sets > 0)
    .sort((a, b) => placeOf(a.one) - placeOf(b.one));
  const inSession = new Set(rows.map(({ one }) => one.exercise.id));
  const early = isEarly(lift.phase);
  const lines = rows.map(({ one, sets: count }): Line => {
    const line = lineOf(one, lift, count, edits[one.slot.id], library);
    const slot = slotsOf(lift.item).find(({ id }) => id === one.slot.id);
    const { candidates } = slot ? library.ranked(lift.item, slot, early) : { candidates: [] };
    const alternatives: string[] = [];
    for (const { exercise } of candidates) {
      if (inSession.has(exercise.id)) continue;
      if (alternatives.push(exercise.id) === ALTERNATIVES) break;
    }
    return { ...line, alternatives };
  });
  // A slot whose only exercise went to another that then stayed closed is short of sets, not of exercises.
  const choice = (id: string): boolean => {
    const slot = slotsOf(lift.item).find((one) => one.id === id);
    if (!slot) return false;
    return library
      .ranked(lift.item, slot, early)
      .candidates.some(({ exercise }) => !inSession.has(exercise.id));
  };
  const worked = rows.map(({ one, sets: count }) => ({ exercise: one.exercise, sets: count }));
  return {
    id: lift.id,
    warmUp: warmUpLines(lift, worked, edits, library),
    lines,
    empty: empty.filter(({ slot }) => !choice(slot)),
    note: edit?.note ?? null,
  };
}

function warmUpLines(
  lift: Lift,
  worked: readonly { readonly exercise: Exercise; readonly sets: number }[],
  edits: Readonly<Record<string, LineEdit>>,
  library: Library,
): readonly Line[] {
  const picked = warmUpOf(lift, worked, library.mobility, library.weights);
  const inSession = new Set(picked.map(({ exercise }) => exercise.id));
  return picked.map((filled): Line => {
    const { exercise, aim } = filled;
    const sets = exercise.doses[aim]?.sets.low ?? 1;
    const line = lineOf(filled, lift, sets, edits[filled.slot.id], library);
    const others = library.mobility.filter(({ id }) => !inSession.has(id));
    return { ...line, alternatives: others.slice(0, ALTERNATIVES).map(({ id }) => id) };
  });
}
