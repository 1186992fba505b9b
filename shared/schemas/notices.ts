/** What a person is told of in the page. */
import { z } from "zod";
import { person } from "./people";

export const noticeKinds = ["mention", "reply"] as const;
export type NoticeKind = (typeof noticeKinds)[number];

export const notice = z.object({
  id: z.string(),
  kind: z.enum(noticeKinds),
  by: person,
  at: z.iso.datetime(),
  isRead: z.boolean(),
  notebook: z.object({ id: z.string(), title: z.string() }),
  thread: z.object({ id: z.string(), version: z.number().int().nullable(), cellName: z.string() }),
  /** How the comment begins. */
  excerpt: z.string(),
});
export type Notice = z.infer<typeof notice>;

export const noticesResponse = z.object({
  /** Latest first, at most a hundred. */
  notices: z.array(notice),
  unread: z.number().int(),
});
export type NoticesResponse = z.infer<typeof noticesResponse>;

/** Which notices were read; null: all of them. */
export const readNoticesBody = z.object({
  ids: z.array(z.uuid("This is not the id of a notice.")).max(100).nullable(),
});
export type ReadNoticesBody = z.infer<typeof readNoticesBody>;
