/**
 * Address that a request comes from: the last one in `x-forwarded-for`, which the proxy in front has added itself; what
 * stands before it anybody can claim. Next sets the header for direct connections.
 */
export const addressIn = (forwardedFor: string | null | undefined): string =>
  forwardedFor?.split(",").at(-1)?.trim() || "direct";
