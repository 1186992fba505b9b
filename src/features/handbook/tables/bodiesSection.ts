import { referringBodyCell, writtenBodyCell } from "../../../../shared/notebook/handbookCells";
import { astronomicalUnit, handbookBodies, type HandbookBody } from "../../../../shared/physics";
import type { HandbookSection, TableColumn, TableRow } from "../handbookTable";

const kilometres = { shift: -3, unit: "km" };

const columns: readonly TableColumn[] = [
  { key: "gm", head: [{ italic: "GM" }], unit: "m^3 s^-2", digits: 7, leastDigits: 5 },
  { key: "radius", head: [{ italic: "R" }], unit: "m", scale: kilometres, digits: 8 },
  {
    key: "equatorial_radius",
    head: [{ italic: "R" }, " at the equator"],
    unit: "m",
    scale: kilometres,
    digits: 8,
  },
  {
    key: "rotation_period",
    head: ["Rotation"],
    unit: "s",
    scale: { per: 86_400, unit: "d" },
    digits: 7,
  },
  {
    key: "star_distance",
    head: ["From the Sun"],
    unit: "m",
    scale: { per: astronomicalUnit.value, unit: "au" },
    digits: 7,
  },
  { key: "planet_distance", head: ["From its planet"], unit: "m", scale: kilometres, digits: 7 },
];

function bodyRow(body: HandbookBody): TableRow {
  const { name, kind, sources, primary } = body;
  const sourced = (value: number | undefined, key: keyof HandbookBody["sources"]) => ({
    value: value ?? null,
    sources: value === undefined || !sources[key] ? [] : [sources[key]],
  });
  return {
    key: name,
    name,
    head: [name],
    words: `${kind} ${primary ? `moon of ${primary.name}` : ""}`,
    values: {
      gm: sourced(body.gravitationalParameter, "gravitationalParameter"),
      radius: sourced(body.radius, "radius"),
      equatorial_radius: sourced(body.equatorialRadius, "equatorialRadius"),
      rotation_period: sourced(body.rotationPeriod, "rotationPeriod"),
      star_distance: sourced(body.starDistance, "starDistance"),
      planet_distance: sourced(primary?.distance, "primary"),
    },
    forms: [
      { label: "by its name in the handbook", choices: [referringBodyCell(body)] },
      { label: "with its numbers written out", choices: [writtenBodyCell(body)] },
    ],
  };
}

export const bodiesSection: HandbookSection = {
  id: "bodies",
  title: "Bodies",
  about: [
    "Gravitational parameter, mean radius (of the giant planets at a pressure of 1 bar), sidereal rotation, negative where a body turns backwards, and orbit. The star is the Sun with its nominal mass, which stands among the constants. A ",
    { code: "body" },
    " cell takes all of it by ",
    { code: "like = handbook(Mars)" },
    ".",
  ],
  tables: [{ id: "bodies", caption: "Bodies", rowHead: "Body", columns, rows: handbookBodies.map(bodyRow) }],
};
