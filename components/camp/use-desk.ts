"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useMemo, useReducer, type Dispatch } from "react";
import { showToast } from "@/components/ui/toasts";
import { isPreview, type PreviewResult } from "@/lib/book/preview-result";
import type { Instant } from "@/lib/engine/types";
import { concerns, type Action } from "@/lib/policy";
import { changesQuery } from "@/lib/query/camps";
import type { CampView } from "@/lib/schemas/camp";
import { deskStep, emptyDesk, type DeskState, type DeskStep, type LiveChange } from "./desk-state";
import { pictureOf, shownPicture, type Picture } from "./picture";
import { usePlanner } from "./use-planner";
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
  /** Fetches the planner, which most visits never need; does nothing for readers who may change nothing. */
  readonly wantPlanner: () => void;
  readonly save: () => void;
}

const WRITES: readonly Action[] = ["sport.write", "lifts.write", "camps.bout"];

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
  const standing = useMemo(() => pictureOf(view), [view]);
  const change = state.pending?.change ?? null;
  const writes = WRITES.some((action) => view.may.includes(action));
  const { planner, want } = usePlanner(standing, now);
  const wantPlanner = useCallback(() => (writes ? want() : undefined), [writes, want]);
  const preview = useMemo(
    () => (change && planner ? planner.previewChange(standing, change, now) : null),
    [planner, standing, change, now],
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
    tryChange: (next) => {
      want();
      dispatch({ type: "try", change: next, key: crypto.randomUUID() });
    },
    wantPlanner,
    save: () => {
      if (state.pending && held && !state.saving)
        saving.mutate({ pending: state.pending, preview: held, view });
    },
  };
}
