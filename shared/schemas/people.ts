import { z } from "zod";

/** A person as others see them. */
export const person = z.object({ id: z.string(), name: z.string() });
export type Person = z.infer<typeof person>;
