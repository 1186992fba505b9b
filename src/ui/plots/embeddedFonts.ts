/** Families and styles that lettering of figures uses. */
const lettering = new Set(["Source Sans 3 normal", "Source Serif 4 italic", "Source Code Pro normal"]);

function fontFaces(): CSSFontFaceRule[] {
  return [...document.styleSheets]
    .flatMap((sheet) => {
      try {
        return [...sheet.cssRules];
      } catch {
        // A sheet of another origin, such as an extension's, does not let its rules be read.
        return [];
      }
    })
    .filter((rule) => rule instanceof CSSFontFaceRule);
}

/** Latin alone: figures have no other letters but λ, for which the reader's own fonts stand in. */
const isLatin = (rule: CSSFontFaceRule): boolean =>
  /^U\+0+-/i.test(rule.style.getPropertyValue("unicode-range").trim());

async function embed(rule: CSSFontFaceRule): Promise<string> {
  const property = (name: string) => rule.style.getPropertyValue(name);
  const source = /url\(["']?([^"')]+)["']?\)/.exec(property("src"))?.[1];
  if (!source) return "";
  const response = await fetch(new URL(source, rule.parentStyleSheet?.href ?? document.baseURI));
  if (!response.ok) return "";
  let bytes = "";
  for (const byte of new Uint8Array(await response.arrayBuffer())) bytes += String.fromCharCode(byte);
  const data = `url(data:font/woff2;base64,${btoa(bytes)}) format("woff2")`;
  return `@font-face{font-family:${property("font-family")};font-style:${property("font-style")};font-weight:200 900;src:${data}}`;
}

/** The lettering's fonts as rules that carry their data, so that a figure looks the same on any machine. */
export async function embeddedFonts(): Promise<string> {
  const faces = fontFaces().filter((rule) => {
    const family = rule.style.getPropertyValue("font-family").replace(/["']/g, "");
    return isLatin(rule) && lettering.has(`${family} ${rule.style.getPropertyValue("font-style")}`);
  });
  return (await Promise.all(faces.map(embed))).join("");
}
