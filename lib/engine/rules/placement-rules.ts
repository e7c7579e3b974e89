import { MUST_RULES } from "./must-rules";
import type { PlacementRule } from "./placement-rule";
import { SHOULD_RULES } from "./should-rules";

/** The rules of placement. Must rules forbid, should rules cost; their values are house rules. */
export const PLACEMENT_RULES: readonly PlacementRule[] = [...MUST_RULES, ...SHOULD_RULES];
