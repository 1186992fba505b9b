import { describe, expect, it } from "vitest";
import type { Strip } from "../../../../shared/notebook/summary";
import { stripDots } from "../../../../src/ui/strip/stripDots";
import { stripLabels } from "../../../../src/ui/strip/stripLabels";
import { leadingGas, sampleStrip } from "../../../../src/ui/strip/stripSample";
import { scaleAboveBase, stripScale, stripTicks, tickSteps } from "../../../../src/ui/strip/stripScale";
import { readStrip, stripLabel, stripSentences } from "../../../../src/ui/strip/stripSentences";
import { stripTone } from "../../../../src/ui/strip/stripTone";
import { ilmara, sampleColumn } from "../../fixtures/sampleColumn";

const { strip } = sampleColumn(ilmara);
const withoutExobase: Strip = { ...strip, exobase: null, lower: null, upper: null };

describe("the scale of the strip", () => {
  it("turns altitudes into px and back", () => {
    const scale = scaleAboveBase(strip, 800, 46);
    expect(scale.along(strip.base)).toBeCloseTo(46, 9);
    expect(scale.along(strip.top)).toBeCloseTo(800, 9);
    expect(scale.altitudeAt(scale.along(300e3))).toBeCloseTo(300e3, 6);
  });

  it("has round ticks, far enough apart", () => {
    expect(tickSteps(63e3)).toEqual({ major: 100e3, minor: 20e3 });
    expect(tickSteps(150e3)).toEqual({ major: 200e3, minor: 50e3 });
    const scale = stripScale(80e3, 640e3, 800);
    const majors = stripTicks(scale, 90).filter(({ isMajor }) => isMajor);
    expect(majors.map(({ altitude }) => altitude)).toEqual([100e3, 200e3, 300e3, 400e3, 500e3, 600e3]);
  });
});

describe("what stands at an altitude", () => {
  it("agrees with the strip's own levels, and lies between them elsewhere", () => {
    const at = sampleStrip(strip, strip.altitude[40]!);
    expect(at.log10NumberDensity).toBeCloseTo(strip.log10NumberDensity[40]!, 9);
    const between = sampleStrip(strip, (strip.altitude[40]! + strip.altitude[41]!) / 2);
    expect(between.temperature).toBeGreaterThan(strip.temperature[40]!);
    expect(between.temperature).toBeLessThan(strip.temperature[41]!);
  });

  it("goes on thinning above the top, where the lightest gas comes to lead", () => {
    const above = sampleStrip(strip, strip.top * 3);
    expect(above.log10NumberDensity).toBeLessThan(strip.log10NumberDensity.at(-1)!);
    expect(above.moleFractions.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 9);
    expect(strip.gases[leadingGas(above)]).toBe("H");
  });
});

describe("labels of the strip", () => {
  it.each([640, 860, 1400])("never touch in a band of %s px, though every homopause lies low", (height) => {
    const crowded = {
      ...strip,
      homopauses: strip.gases.map((gas, i) => ({ gas, altitude: 82e3 + i * 300 })),
    };
    const labels = stripLabels(crowded, scaleAboveBase(crowded, height, 46), 48);
    expect(labels.filter(({ kind }) => kind === "homopause")).toHaveLength(strip.gases.length);
    labels.slice(1).forEach((label, i) => expect(label.label - labels[i]!.label).toBeGreaterThan(13));
    expect(labels.at(-1)!.label).toBeLessThanOrEqual(height - 48);
  });

  it("keep base and exobase where they are", () => {
    for (const { kind, mark, label } of stripLabels(strip, scaleAboveBase(strip, 860, 46), 48)) {
      if (kind === "base" || kind === "exobase") expect(Math.abs(mark - label)).toBeLessThan(2);
    }
  });

  it("leave out what does not exist", () => {
    const kinds = stripLabels(withoutExobase, scaleAboveBase(strip, 860, 46), 48).map(({ kind }) => kind);
    expect(kinds).not.toContain("exobase");
    expect(kinds).toContain("base");
  });
});

describe("tone and dots", () => {
  const scale = scaleAboveBase(strip, 860, 46);

  it("lays the leading gas thickest at the base, and nothing where no fluid is left", () => {
    const tones = stripTone(strip, scale);
    const atBase = tones.map(({ gas, stops }) => [gas, stops[3]!.opacity] as const);
    const thickest = atBase.reduce((a, b) => (b[1] > a[1] ? b : a));
    expect(thickest[0]).toBe("CO2");
    expect(thickest[1]).toBeGreaterThan(0.6);
    for (const { stops } of tones) for (const { opacity } of stops) expect(opacity).toBeLessThanOrEqual(0.9);
  });

  it("does not fade where there is no exobase", () => {
    const tones = stripTone(withoutExobase, scale);
    const left = tones.reduce((sum, { stops }) => sum + stops.at(-1)!.opacity, 0);
    expect(left).toBeGreaterThan(0.1);
    expect(stripDots(withoutExobase, scale, 104, 5)).toEqual([]);
  });

  it("gives the same dots for the same text", () => {
    expect(stripDots(strip, scale, 104, 5)).toEqual(stripDots(structuredClone(strip), scale, 104, 5));
  });

  it("keeps dots apart and inside the band, most of them near the exobase", () => {
    const dots = stripDots(strip, scale, 104, 5).flatMap(({ dots: some }) => some);
    expect(dots.length).toBeGreaterThan(150);
    for (const [i, a] of dots.entries()) {
      expect(a.across).toBeGreaterThan(0);
      expect(a.across).toBeLessThan(104);
      for (const b of dots.slice(0, i)) {
        expect(Math.hypot(a.along - b.along, a.across - b.across)).toBeGreaterThanOrEqual(4.99);
      }
    }
    const exobase = scale.along(strip.exobase!);
    const within = (from: number, to: number) =>
      dots.filter(({ along }) => along > from && along <= to).length;
    expect(within(exobase, exobase + 100)).toBeGreaterThan(2 * within(exobase + 300, exobase + 400));
  });

  it("moves few of them when a number changes a little", () => {
    const warmer = sampleColumn({ ...ilmara, temperatures: [165, 424] }).strip;
    const key = ({ along, across }: { along: number; across: number }) =>
      `${along.toFixed(3)} ${across.toFixed(3)}`;
    const places = (of: Strip) =>
      new Set(stripDots(of, scaleAboveBase(of, 860, 46), 104, 5).flatMap(({ dots }) => dots.map(key)));
    const before = places(strip);
    const after = places(warmer);
    const kept = [...before].filter((place) => after.has(place)).length;
    expect(kept / before.size).toBeGreaterThan(0.9);
  });
});

describe("the strip in words", () => {
  it("tells every mark once, from the base up", () => {
    const sentences = stripSentences(strip);
    expect(sentences[0]).toBe("The column begins at its base, 80\u00a0km.");
    expect(sentences.filter((sentence) => sentence.includes("homopause"))).toHaveLength(
      strip.homopauses.length,
    );
    expect(sentences.some((sentence) => sentence.startsWith("The exobase is at"))).toBe(true);
    expect(stripLabel(strip)).toMatch(/^Altitude strip of dayside: base at 80\skm, exobase at \d+\skm$/);
  });

  it("says that there is no exobase", () => {
    expect(stripLabel(withoutExobase)).toContain("no exobase");
    expect(stripSentences(withoutExobase).at(-1)).toContain("no exobase below");
  });

  it("reads out what stands at an altitude, in either system", () => {
    const reading = readStrip(strip, 300e3, "cgs");
    expect(reading.spoken).toContain("cm⁻³");
    expect(reading.spoken).toMatch(/^300\skm, \d+\sK, .* mostly O, \d+.%, Knudsen number/);
  });
});
