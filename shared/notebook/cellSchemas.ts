/** What each kind of cell takes: one schema for evaluation, completion, hover, forms and help. */
import type { CellKind } from "./document";
import { bodySchema } from "./kinds/body";
import type { CellSchema } from "./kinds/cellSchema";
import { columnSchema } from "./kinds/column";
import { coronaSchema } from "./kinds/corona";
import { escapeSchema } from "./kinds/escape";
import { gasSchema } from "./kinds/gas";
import { lossSchema } from "./kinds/loss";
import { nonthermalSchema } from "./kinds/nonthermal";
import { proseSchema } from "./kinds/prose";
import { spreadSchema } from "./kinds/spread";
import { sweepSchema } from "./kinds/sweep";
import { valuesSchema } from "./kinds/values";

export const cellSchemas: Readonly<Record<CellKind, CellSchema>> = {
  prose: proseSchema,
  values: valuesSchema,
  body: bodySchema,
  gas: gasSchema,
  column: columnSchema,
  escape: escapeSchema,
  corona: coronaSchema,
  nonthermal: nonthermalSchema,
  sweep: sweepSchema,
  spread: spreadSchema,
  loss: lossSchema,
};
