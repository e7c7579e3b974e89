// Stands in for the package `server-only`, which throws when imported outside of Next.
export {};
