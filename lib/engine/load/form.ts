import type { Day, Form, HouseRules } from "../types";

/** Two-component impulse-response model. Time constants in days, gains without unit. */
export interface FormModel {
  readonly tau1: number;
  readonly tau2: number;
  readonly k1: number;
  readonly k2: number;
}

export const formModel = (rules: HouseRules): FormModel => ({
  tau1: rules["form.tau1"],
  tau2: rules["form.tau2"],
  k1: rules["form.k1"],
  k2: rules["form.k2"],
});

export interface FormMorning {
  readonly fitness: number;
  readonly fatigue: number;
  readonly performance: number;
}

/**
 * The mornings of `loads.length + 1` days: each knows the loads of the days before it, never its own.
 * g(n) = (g(n-1) + w(n-1)) x exp(-1/tau1), h likewise, p = p0 + k1 g - k2 h.
 * Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177.
 */
export function impulseResponse(loads: readonly number[], model: FormModel, p0 = 0): readonly FormMorning[] {
  const keep1 = Math.exp(-1 / model.tau1);
  const keep2 = Math.exp(-1 / model.tau2);
  let [fitness, fatigue] = [0, 0];
  const mornings: FormMorning[] = [{ fitness, fatigue, performance: p0 }];
  for (const load of loads) {
    fitness = (fitness + load) * keep1;
    fatigue = (fatigue + load) * keep2;
    mornings.push({ fitness, fatigue, performance: p0 + model.k1 * fitness - model.k2 * fatigue });
  }
  return mornings;
}

/** Where fitness or fatigue settles under a constant daily load: w x e / (1 - e), e = exp(-1 / tau). */
export function steadyState(load: number, tau: number): number {
  const keep = Math.exp(-1 / tau);
  return (load * keep) / (1 - keep);
}

/**
 * What one unit of load `days` before the bout does on the day: below 0 it costs.
 * Influence curve: Fitz-Clarke, Morton & Banister 1991, J Appl Physiol 71:1151-1158.
 */
export function influence(days: number, { tau1, tau2, k1, k2 }: FormModel): number {
  return k1 * Math.exp(-days / tau1) - k2 * Math.exp(-days / tau2);
}

/** Days before the bout at which the influence is 0: training nearer than that costs (t_n, Fitz-Clarke 1991). */
export function daysTrainingStopsHelping({ tau1, tau2, k1, k2 }: FormModel): number {
  return ((tau1 * tau2) / (tau1 - tau2)) * Math.log(k2 / k1);
}

/** Days before the bout at which the influence is greatest (t_g, Fitz-Clarke 1991). */
export function daysTrainingHelpsMost({ tau1, tau2, k1, k2 }: FormModel): number {
  return ((tau1 * tau2) / (tau1 - tau2)) * Math.log((k2 * tau1) / (k1 * tau2));
}

/**
 * The illustration of a camp: model performance each morning from 0 on the first. The two lines never lie after the bout:
 * with a gain of fatigue below that of fitness every day of training helps, which reads as 0 days.
 */
export function formOf(from: Day, dailyLoads: readonly number[], rules: HouseRules): Form {
  const model = formModel(rules);
  return {
    from,
    values: impulseResponse(dailyLoads.slice(0, -1), model).map((morning) => morning.performance),
    stopsHelping: Math.max(0, daysTrainingStopsHelping(model)),
    helpsMost: Math.max(0, daysTrainingHelpsMost(model)),
  };
}
