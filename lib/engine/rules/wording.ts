/** "23.9 h": cut, not rounded, so that a gap just short of a rule never reads as if it kept it. */
export const hoursText = (minutes: number): string => `${Math.floor(Math.max(0, minutes) / 6) / 10} h`;

export const daysText = (count: number): string => `${count} ${count === 1 ? "day" : "days"}`;
