import { expect, it } from "vitest";
import { fileName } from "../../../server/routes/fileName";

it.each([
  ["Escape of hydrogen from Ilmara’s dayside", "escape-of-hydrogen-from-ilmaras-dayside.md"],
  ["Öda: perihelion / aphelion", "oda-perihelion-aphelion.md"],
  ["../../etc/passwd", "etc-passwd.md"],
  ['a"\r\nSet-Cookie: x', "a-set-cookie-x.md"],
  ["大気", "notebook.md"],
  ["", "notebook.md"],
])("the file of %j is %s", (title, name) => {
  expect(fileName(title)).toBe(name);
});
