import type { BookPin, Bout, CampBook, CampResponse, SportEntry } from "@/lib/schemas/camp-book";

/**
 * A change made concrete: what it puts into the camp book and what it takes out. Every change becomes one edit, every
 * edit has an inverse, so undo needs no code of its own for each kind of change.
 */
export interface BookEdit {
  readonly status?: CampBook["status"];
  readonly bout?: Bout;
  readonly weeks?: number;
  readonly weighIn?: CampBook["weighIn"];
  readonly putSport?: readonly SportEntry[];
  readonly dropSport?: readonly string[];
  readonly putPins?: readonly BookPin[];
  readonly dropPins?: readonly string[];
  readonly putResponses?: readonly CampResponse[];
  readonly dropResponses?: readonly string[];
  /** Null takes the factor away. */
  readonly factors?: Readonly<Record<string, number | null>>;
}

const without = <T>(list: readonly T[], key: (value: T) => string, gone: ReadonlySet<string>): T[] =>
  list.filter((value) => !gone.has(key(value)));

const put = <T>(list: readonly T[], key: (value: T) => string, values: readonly T[]): T[] => {
  const fresh = new Map(values.map((value) => [key(value), value]));
  const replaced = list.map((value) => fresh.get(key(value)) ?? value);
  const known = new Set(list.map(key));
  return [...replaced, ...values.filter((value) => !known.has(key(value)))];
};

const sportKey = (entry: SportEntry) => entry.id;
const pinKey = (pin: BookPin) => pin.liftId;
const responseKey = (response: CampResponse) => response.id;
/** Always in the same order, so that putting one back restores the list as it was. */
const byDays = (a: CampResponse, b: CampResponse): number => {
  const [one, other] = [a, b].map(({ from, to, id }) => `${from} ${to} ${id}`);
  return one === other ? 0 : (one ?? "") < (other ?? "") ? -1 : 1;
};

/** The book after the edit; the one given is not touched. */
export function applyEdit(book: CampBook, edit: BookEdit): CampBook {
  const factors = { ...book.coachFactors };
  for (const [id, factor] of Object.entries(edit.factors ?? {})) {
    if (factor === null) delete factors[id];
    else factors[id] = factor;
  }
  return {
    ...book,
    status: edit.status ?? book.status,
    bout: edit.bout ?? book.bout,
    weeks: edit.weeks ?? book.weeks,
    weighIn: edit.weighIn === undefined ? book.weighIn : edit.weighIn,
    sport: put(without(book.sport, sportKey, new Set(edit.dropSport ?? [])), sportKey, edit.putSport ?? []),
    pins: put(without(book.pins, pinKey, new Set(edit.dropPins ?? [])), pinKey, edit.putPins ?? []),
    coachFactors: factors,
    responses: put(
      without(book.responses, responseKey, new Set(edit.dropResponses ?? [])),
      responseKey,
      edit.putResponses ?? [],
    ).sort(byDays),
  };
}

const inverseOfList = <T>(
  list: readonly T[],
  key: (value: T) => string,
  puts: readonly T[],
  drops: readonly string[],
) => {
  const before = new Map(list.map((value) => [key(value), value]));
  const touched = [...puts.map(key), ...drops];
  const back: T[] = [];
  const gone: string[] = [];
  for (const id of touched) {
    const old = before.get(id);
    if (old) back.push(old);
    else gone.push(id);
  }
  return { back, gone };
};

/** The edit that takes `applyEdit(book, edit)` back to `book`, for what the edit touches. */
export function inverseOf(book: CampBook, edit: BookEdit): BookEdit {
  const sport = inverseOfList(book.sport, sportKey, edit.putSport ?? [], edit.dropSport ?? []);
  const pins = inverseOfList(book.pins, pinKey, edit.putPins ?? [], edit.dropPins ?? []);
  const responses = inverseOfList(
    book.responses,
    responseKey,
    edit.putResponses ?? [],
    edit.dropResponses ?? [],
  );
  return {
    ...(edit.status !== undefined && { status: book.status }),
    ...(edit.bout !== undefined && { bout: book.bout }),
    ...(edit.weeks !== undefined && { weeks: book.weeks }),
    ...(edit.weighIn !== undefined && { weighIn: book.weighIn }),
    putSport: sport.back,
    dropSport: sport.gone,
    putPins: pins.back,
    dropPins: pins.gone,
    putResponses: responses.back,
    dropResponses: responses.gone,
    factors: Object.fromEntries(
      Object.keys(edit.factors ?? {}).map((id) => [id, book.coachFactors[id] ?? null]),
    ),
  };
}
