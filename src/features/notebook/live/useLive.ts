import { useQueryClient, type QueryClient } from "@tanstack/react-query";
import { useEffect, useMemo, useState } from "react";
import { z } from "zod";
import {
  liveEvent,
  liveEventTypes,
  type ChangedPart,
  type PresentPerson,
} from "../../../../shared/schemas/live";
import { api } from "../../../lib/api";
import { noticesQuery } from "../../../lib/notices";
import { notebookQuery, versionsQuery } from "../notebookQueries";
import type { LiveNotebook } from "./liveContext";

/** Wait before a stream that was refused is asked for again, ms. A lost one the browser takes up by itself. */
const refusedWait = 10_000;

/** Rest before one's place is told, ms: going through cells should not tell of each. */
const moveRest = 400;

interface LiveOptions {
  /** null while it is not known whether there is such a notebook. */
  notebookId: string | null;
  ownId: string;
  onConnected: (isConnected: boolean) => void;
}

/**
 * Listens to what happens to a notebook, reads anew what has changed, and tells where one is. Only while the page can be
 * seen: a browser has few connections to a server, and hidden pages need none.
 */
export function useLive({ notebookId, ownId, onConnected }: LiveOptions): LiveNotebook {
  const queryClient = useQueryClient();
  const [people, setPeople] = useState<readonly PresentPerson[]>([]);
  const [place] = useState(createPlace);

  useEffect(
    function listen() {
      if (notebookId === null) return;
      let source: EventSource | null = null;
      let timer: ReturnType<typeof setTimeout> | undefined;

      const lose = () => {
        place.leave();
        onConnected(false);
        setPeople([]);
      };
      const close = () => {
        clearTimeout(timer);
        source?.close();
        source = null;
        lose();
      };
      const handle = ({ data }: MessageEvent<string>) => {
        const event = liveEvent.parse(JSON.parse(data));
        if (event.type === "presence") setPeople(event.people);
        else if (event.type === "changed") readAnew(queryClient, notebookId, event.part);
        else if (event.type === "opened") {
          place.enter(notebookId, event.connectionId);
          onConnected(true);
          for (const part of ["draft", "threads", "notebook"] as const)
            readAnew(queryClient, notebookId, part);
        } else {
          close();
          readAnew(queryClient, notebookId, "notebook");
          timer = setTimeout(open, refusedWait);
        }
      };
      const open = () => {
        clearTimeout(timer);
        if (source || document.visibilityState === "hidden") return;
        const opened = new EventSource(`/api/notebooks/${notebookId}/events`);
        source = opened;
        for (const type of liveEventTypes) opened.addEventListener(type, handle);
        opened.onerror = () => {
          lose();
          if (opened.readyState !== EventSource.CLOSED) return;
          source = null;
          timer = setTimeout(open, refusedWait);
        };
      };
      const whenSeen = () => (document.visibilityState === "hidden" ? close() : open());

      open();
      document.addEventListener("visibilitychange", whenSeen);
      return () => {
        document.removeEventListener("visibilitychange", whenSeen);
        close();
      };
    },
    [notebookId, onConnected, place, queryClient],
  );

  return useMemo(
    () => ({ others: people.filter(({ person }) => person.id !== ownId), moveTo: place.moveTo }),
    [people, ownId, place],
  );
}

function readAnew(queryClient: QueryClient, id: string, part: ChangedPart): void {
  const { queryKey } = notebookQuery(id);
  if (part === "threads") {
    void queryClient.invalidateQueries({ queryKey: [...queryKey, "threads"] });
    void queryClient.invalidateQueries({ queryKey: noticesQuery.queryKey });
    return;
  }
  void queryClient.invalidateQueries({ queryKey, exact: true });
  if (part === "draft") return;
  void queryClient.invalidateQueries({ queryKey: versionsQuery(id).queryKey, exact: true });
  void queryClient.invalidateQueries({ queryKey: [...queryKey, "shares"] });
  void queryClient.invalidateQueries({ queryKey: [...queryKey, "readers"] });
}

/** Where one is in the notebook, and how the server hears of it. */
function createPlace() {
  let connection: { notebookId: string; connectionId: string } | null = null;
  let cellId: string | null = null;
  let told: string | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;

  const tell = () => {
    if (!connection || told === cellId) return;
    const { notebookId, connectionId } = connection;
    told = cellId;
    // What gets lost on the way is made good by the next step.
    api
      .put(`/notebooks/${notebookId}/presence`, { connectionId, cellId }, z.unknown())
      .catch(() => undefined);
  };

  return {
    enter(notebookId: string, connectionId: string): void {
      connection = { notebookId, connectionId };
      told = null;
      tell();
    },
    leave(): void {
      connection = null;
      clearTimeout(timer);
    },
    moveTo(next: string | null): void {
      cellId = next;
      clearTimeout(timer);
      timer = setTimeout(tell, moveRest);
    },
  };
}
