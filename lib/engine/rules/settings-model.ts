import { setting, type Setting } from "./setting";

/** Load figures and the form illustration. See `house-rules.ts`. */
export const MODEL_SETTINGS = {
  "monotony.high": setting(
    "load",
    "Monotony called high above",
    2,
    "ratio",
    [1, 4, 0.1],
    "Same load, every day alike, goes with illness.",
    "Foster 1998, Med Sci Sports Exerc 30:1164-1168",
  ),

  "form.tau1": setting(
    "form",
    "Time constant of fitness",
    45,
    "days",
    [30, 60, 1],
    "An illustration of training theory, not a forecast.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.tau2": setting(
    "form",
    "Time constant of fatigue",
    15,
    "days",
    [3, 25, 1],
    "As above.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.k1": setting(
    "form",
    "Gain of fitness",
    1,
    "ratio",
    [0.5, 3, 0.1],
    "As above.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.k2": setting(
    "form",
    "Gain of fatigue",
    2,
    "ratio",
    [0.5, 5, 0.1],
    "As above; more than the gain of fitness.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
} as const satisfies Record<string, Setting>;
