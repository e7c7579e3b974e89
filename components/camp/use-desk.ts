"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useMemo, useReducer, type Dispatch } from "react";
import { showToast } from "@/components/ui/toasts";
import { isPreview, previewChange, type PreviewResult } from "@/lib/book";
import type { Instant } from "@/lib/engine/types";
import { concerns } from "@/lib/policy";
import { changesQuery } from "@/lib/query/camps";
import type { CampView } from "@/lib/schemas/camp";
import { deskStep, emptyDesk, type DeskState, type DeskStep, type LiveChange } from "./desk-state";
import { pictureOf, shownPicture, type Picture } from "./picture";
import { usePutBack } from "./use-put-back";
import { useSave } from "./use-save";

/** One camp on the desk: as saved, what is being tried with it, and what that does. */
export interface Desk {
  readonly view: CampView;
  readonly now: Instant;
  readonly state: DeskState;
  readonly standing: Picture;
  readonly shown: Picture;
  readonly preview: PreviewResult | null;
  /** How many people saving would tell. */
  readonly people: number;
  readonly dispatch: Dispatch<DeskStep>;
  readonly tryChange: (change: LiveChange) => void;
  readonly save: () => void;
}

/** Runs the engine and leaves a mark in the browser's performance timeline, where the bench reads how long it took. */
function timedPreview(standing: Picture, change: LiveChange, now: Instant): PreviewResult {
  const start = performance.now();
  const result = previewChange(standing, change, now);
  performance.measure("bellward.preview", { start, end: performance.now() });
  return result;
}

/** Tells the reader what others saved: in the rail while a change is being tried, in a corner of the page otherwise. */
function useNews(view: CampView, state: DeskState, dispatch: Desk["dispatch"]): void {
  const client = useQueryClient();
  const news = view.revision > state.seen && state.saving === null;
  const trying = state.pending !== null;
  useEffect(() => {
    if (!news) return;
    let current = true;
    const tell = async (): Promise<void> => {
      const changes = view.may.includes("camps.history")
        ? await client.fetchQuery({ ...changesQuery(view.id), staleTime: 0 }).catch(() => [])
        : [];
      if (!current) return;
      const missed = changes.filter((change) => change.number > state.seen && change.number <= view.revision);
      dispatch({
        type: "news",
        missed: [...missed].sort((a, b) => a.number - b.number),
        seen: view.revision,
      });
      if (trying) return;
      if (missed.length === 0) showToast("This camp has just changed.");
      for (const change of missed) showToast(`${change.by}: ${change.summary}`);
    };
    void tell();
    return () => {
      current = false;
    };
  }, [news, trying, view, state.seen, client, dispatch]);
}

/** The state of the camp page. `selected` is the session whose details are open at first. */
export function useDesk(view: CampView, now: Instant, selected: string | null): Desk {
  const [state, dispatch] = useReducer(deskStep, emptyDesk(view.revision, selected));
  const standing = useMemo(() => pictureOf(view, now), [view, now]);
  const change = state.pending?.change ?? null;
  const preview = useMemo(
    () => (change ? timedPreview(standing, change, now) : null),
    [standing, change, now],
  );
  const shown = useMemo(() => shownPicture(standing, preview), [standing, preview]);
  const putBack = usePutBack(view.id, dispatch);
  const saving = useSave(view.id, dispatch, putBack.mutate);
  useNews(view, state, dispatch);

  const held = preview && isPreview(preview) ? preview : null;
  return {
    view,
    now,
    state,
    standing,
    shown,
    preview,
    people: held ? view.others.filter((role) => concerns(role, held)).length : 0,
    dispatch,
    tryChange: (next) => dispatch({ type: "try", change: next, key: crypto.randomUUID() }),
    save: () => {
      if (state.pending && held && !state.saving)
        saving.mutate({ pending: state.pending, preview: held, view });
    },
  };
}
