"use client";

import { useSyncExternalStore } from "react";

const never = (): (() => void) => () => {};
const browserZone = (): string => Intl.DateTimeFormat().resolvedOptions().timeZone || "UTC";
/** The server cannot know where its reader is. */
const unknownZone = (): string => "UTC";

let names: readonly string[] | undefined;
const knownZones = (): readonly string[] => (names ??= Intl.supportedValuesOf("timeZone"));
const NO_ZONES: readonly string[] = [];
const noZones = (): readonly string[] => NO_ZONES;

/** Where this browser is, as an IANA zone; "UTC" in the first paint. */
export const useBrowserZone = (): string => useSyncExternalStore(never, browserZone, unknownZone);

/** All zones this browser knows; none in the first paint, since server and browser may know different ones. */
export const useKnownZones = (): readonly string[] => useSyncExternalStore(never, knownZones, noZones);
