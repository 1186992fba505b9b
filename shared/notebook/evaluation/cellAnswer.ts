import type { CellModel } from "./models";
import type { Quantity } from "../language/quantity";
import type { CellEvaluation, CellResult } from "../result";
import type { Strip } from "../summary";
import type { TaskAnswer } from "../tasks";
import type { TaskPlan } from "./taskPlan";

/** What a kind finds out about one of its cells, besides its notes. */
export interface CellAnswer {
  values?: CellResult["values"];
  tables?: CellResult["tables"];
  profiles?: CellResult["profiles"];
  gases?: string[];
  strip?: Strip;
  /** Of an escape cell. */
  convention?: CellEvaluation["convention"];
  /** Of an escape cell that is solved with its flux. */
  column?: CellEvaluation["column"];
  /** Of a corona cell. */
  corona?: CellEvaluation["corona"];
  /** Of a nonthermal cell. */
  ion?: string;
  /** Of a loss cell. */
  lightHistory?: CellEvaluation["lightHistory"];
  /** What the cells below may build on. */
  model?: CellModel;
  /** Entries that are names of the whole notebook; null where one has a fault. */
  globals?: Record<string, Quantity | null>;
  /** Of a sweep or spread: what is to be computed, and its answer once it has been. */
  plan?: TaskPlan;
  taskAnswer?: TaskAnswer;
}
