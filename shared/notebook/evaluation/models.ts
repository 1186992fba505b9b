/** What a cell hands to the cells below it, besides its values. Bare numbers are SI. */
import type {
  Column,
  CollisionParameter,
  ColumnInput,
  ColumnLevel,
  CoupledInput,
  CoupledOutcome,
} from "../../physics";

export interface BodyModel {
  kind: "body";
  gravitationalParameter: number;
  radius: number;
  centrifugal: ColumnInput["centrifugal"];
  hillRadius: number | null;
  /** null where flux or efficiency is not given, or where no tidal factor exists. */
  energyLimitedMassRate: number | null;
}

/** What a gas cell states; null where the handbook goes on to hold. */
export interface GasModel {
  kind: "gas";
  formula: string;
  mass: number | null;
  collisionDiameter: number | null;
  thermalDiffusionFactor: number | null;
  /** By the formula of the other gas. */
  collisions: Readonly<Record<string, CollisionParameter>>;
}

export interface ColumnModel {
  kind: "column";
  column: Column;
  body: BodyModel;
}

export interface EscapeModel {
  kind: "escape";
  /** The column that the gases leave from, with their fluxes where they are coupled. */
  source: ColumnModel;
  /** The column's level at the exobase. */
  exobase: ColumnLevel;
  /** What was solved, where the flux is coupled; kept to be used again. */
  coupled: { input: CoupledInput; outcome: CoupledOutcome } | null;
}

export type CellModel = BodyModel | GasModel | ColumnModel | EscapeModel;
