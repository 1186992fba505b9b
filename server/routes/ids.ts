import type { Request } from "express";
import { z } from "zod";
import { notFound } from "../errors";

const uuid = z.uuid();
const ordinal = z.coerce.number().int().min(1).max(2_147_483_647);

/** An id out of the address. What is not even an id names nothing: not found, like one that is nobody's. */
export function readId(req: Request, parameter: string, what: string): string {
  const id = uuid.safeParse(req.params[parameter]);
  if (!id.success) throw notFound(what);
  return id.data.toLowerCase();
}

/** A number from 1 out of the address. */
export function readOrdinal(req: Request, parameter: string, what: string): number {
  const number = ordinal.safeParse(req.params[parameter]);
  if (!number.success) throw notFound(what);
  return number.data;
}
