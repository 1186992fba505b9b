/** What an open notebook is told as it happens: server-sent events, named by `type`, their data in JSON. */
import { z } from "zod";
import { person } from "./people";

/** Someone who has the notebook open, and the cell they are at. */
export const presentPerson = z.object({ person, cellId: z.string().nullable() });
export type PresentPerson = z.infer<typeof presentPerson>;

/** What has changed: read it anew. */
export const changedParts = ["draft", "threads", "notebook"] as const;
export type ChangedPart = (typeof changedParts)[number];

export const liveEvent = z.discriminatedUnion("type", [
  /** The first on every connection; whatever happened before it must be read anew. */
  z.object({ type: z.literal("opened"), connectionId: z.string() }),
  z.object({ type: z.literal("changed"), part: z.enum(changedParts), by: person }),
  /** Everyone who has it open, the reader included; each person once. */
  z.object({ type: z.literal("presence"), people: z.array(presentPerson) }),
  /** The last: the notebook may not be seen any longer, or the session is over. */
  z.object({ type: z.literal("closed") }),
]);
export type LiveEvent = z.infer<typeof liveEvent>;
export const liveEventTypes = ["opened", "changed", "presence", "closed"] as const;

export const setPresenceBody = z.object({
  connectionId: z.uuid("This is not the id of a connection."),
  cellId: z.string().max(64).nullable(),
});
export type SetPresenceBody = z.infer<typeof setPresenceBody>;
