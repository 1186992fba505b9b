import type { ChangedPart, LiveEvent, PresentPerson } from "../../shared/schemas/live";
import type { Person } from "../../shared/schemas/people";

/** One open page of a notebook, at the server's end. */
export interface Listener {
  connectionId: string;
  notebookId: string;
  person: Person;
  send: (event: LiveEvent) => void;
  /** Ends the stream. */
  end: () => void;
  /** Whether the person may still see the notebook and is still signed in. */
  maySee: () => Promise<boolean>;
}

export interface Live {
  /** Takes a listener in and tells all who is there; answers how it leaves. */
  join(listener: Listener): () => void;
  /** Tells everyone in a notebook what to read anew. */
  tell(notebookId: string, change: { part: ChangedPart; by: Person }): void;
  /** Where in the notebook somebody is. False: no such connection of theirs. */
  moveTo(place: {
    notebookId: string;
    connectionId: string;
    personId: string;
    cellId: string | null;
  }): boolean;
  /** Ends the streams of those who may not see their notebook any longer; of all, unless some are named. */
  recheck(which?: { notebookId?: string; connectionId?: string }): Promise<void>;
  /** Ends every stream; nobody is let in afterwards. */
  close(): void;
}

interface Joined extends Listener {
  cellId: string | null;
}

/**
 * Who has which notebook open, and what they are told. It is kept in this process alone: nothing of it matters after
 * the process, since pages read everything anew when they connect again.
 */
export function createLive(): Live {
  const joined = new Set<Joined>();
  let isClosed = false;

  const inNotebook = (notebookId: string): Joined[] =>
    [...joined].filter((listener) => listener.notebookId === notebookId);

  const send = (notebookId: string, event: LiveEvent): void => {
    for (const listener of inNotebook(notebookId)) listener.send(event);
  };

  const sendPresence = (notebookId: string): void =>
    send(notebookId, { type: "presence", people: presentIn(inNotebook(notebookId)) });

  const leave = (listener: Joined): void => {
    if (joined.delete(listener)) sendPresence(listener.notebookId);
  };

  const dismiss = (listener: Joined): void => {
    listener.send({ type: "closed" });
    listener.end();
    leave(listener);
  };

  return {
    join: (listener) => {
      const own: Joined = { ...listener, cellId: null };
      if (isClosed) {
        listener.end();
        return () => undefined;
      }
      joined.add(own);
      listener.send({ type: "opened", connectionId: listener.connectionId });
      sendPresence(listener.notebookId);
      return () => leave(own);
    },

    tell: (notebookId, { part, by }) => send(notebookId, { type: "changed", part, by }),

    moveTo: ({ notebookId, connectionId, personId, cellId }) => {
      const own = inNotebook(notebookId).find(
        (listener) => listener.connectionId === connectionId && listener.person.id === personId,
      );
      if (!own) return false;
      if (own.cellId !== cellId) {
        own.cellId = cellId;
        // Whoever moved last stands last: of several pages of one person the latest counts.
        joined.delete(own);
        joined.add(own);
        sendPresence(notebookId);
      }
      return true;
    },

    recheck: async ({ notebookId, connectionId } = {}) => {
      const asked = [...joined].filter(
        (listener) =>
          (notebookId === undefined || listener.notebookId === notebookId) &&
          (connectionId === undefined || listener.connectionId === connectionId),
      );
      await Promise.all(
        asked.map(async (listener) => {
          // Where it can't be found out, the stream is not kept open on a guess.
          const maySee = await listener.maySee().catch(() => false);
          if (!maySee && joined.has(listener)) dismiss(listener);
        }),
      );
    },

    close: () => {
      isClosed = true;
      for (const listener of joined) listener.end();
      joined.clear();
    },
  };
}

/** Each person once, at the cell of the page they were busy in last, in the order of their names. */
function presentIn(listeners: readonly Joined[]): PresentPerson[] {
  const people = new Map<string, PresentPerson>();
  for (const { person, cellId } of listeners) {
    people.set(person.id, { person, cellId: cellId ?? people.get(person.id)?.cellId ?? null });
  }
  return [...people.values()].sort((one, other) => one.person.name.localeCompare(other.person.name, "en"));
}
