import { describe, expect, it } from "vitest";
import type { Note } from "../../../../shared/notebook/result";
import { numberIn, resultOf, type WrittenCell } from "../evaluateCells";
import { answerInParts, completed, completedLast, numberOf, planet, rowsOf } from "./taskNotebooks";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const spread = (text: string): WrittenCell => ["spread", "sure", text];
const codes = ({ notes }: { notes: Note[] }) => notes.map(({ code }) => code);

describe("a spread", () => {
  it("has the quantiles of a normal entry, within its own standard errors", () => {
    const result = completedLast(["values", "given", "x = 240 ± 30 K"], spread("watch = x"));
    // 16 % lie beyond 0.99446, 2.5 % beyond 1.95996 standard deviations
    const expected = {
      median: 240,
      lower: 240 - 29.8337,
      upper: 240 + 29.8337,
      q2_5: 240 - 58.7989,
      q97_5: 240 + 58.7989,
    };
    for (const [name, quantile] of Object.entries(expected)) {
      const error = numberIn(result, `x.${name}_error`);
      expect(error).toBeLessThan(0.3);
      expect(numberIn(result, `x.${name}`)).toAgreeWith({
        what: `${name} of 240 ± 30 K over 4096 draws, within four of its own standard errors`,
        unit: "K",
        published: quantile,
        within: { absolute: 4 * error + 0.005 },
        source: "AbramowitzStegun1964",
        mark: "published",
      });
    }
    expect(result.values["x.median"].unit).toBe("K");
    expect(result.values.draws.value).toBe(4096);
    expect(result.values.faulted_share.value).toBe(0);
  });

  it("has those of a uniform and of a log-normal entry", () => {
    const result = completedLast(
      ["values", "given", "flat = between 180 and 350 K\nv = 2.5e5 /cm^3 within factor 2"],
      spread("watch = flat, v"),
    );
    expect(numberIn(result, "flat.median")).toBeCloseToRelative(265, 1e-3);
    expect(numberIn(result, "flat.q97_5")).toBeCloseToRelative(180 + 0.975 * 170, 1e-3);
    expect(numberIn(result, "v.median")).toBeCloseToRelative(2.5e11, 2e-3);
    // 2^0.994458, as above
    expect(numberIn(result, "v.upper")).toBeCloseToRelative(2.5e11 * 1.992333, 5e-3);
  });

  it("adds independent deviations in squares, and shares the variance the same way", () => {
    const result = completedLast(
      ["values", "given", "x = 3 ± 3 m\ny = 1 ± 2 m\nz = 5 ± 1 m\nsum = x + y + z"],
      spread("watch = sum"),
    );
    // Normal with a deviation of √14
    expect(numberIn(result, "sum.upper") - 9).toBeCloseToRelative(0.994458 * Math.sqrt(14), 0.02);
    const shares = rowsOf(result, "sensitivity");
    expect(shares.map(({ input }) => input)).toEqual(["x", "y", "z"]);
    [9 / 14, 4 / 14, 1 / 14].forEach((exact, place) => {
      const error = numberOf(shares[place], "variance_share_error");
      expect(Math.abs(numberOf(shares[place], "variance_share") - exact)).toBeLessThan(4 * error + 2e-3);
    });
    expect(shares.map(({ scale }) => scale)).toEqual(["linear", "linear", "linear"]);
  });

  it("draws an entry once for all that use it", () => {
    const result = completedLast(
      ["values", "given", "x = 100 ± 10 K\ntwice = 2 * x\nnone = twice - x - x"],
      spread("watch = none, twice"),
    );
    expect(result.values["none.q97_5"].value).toBe(0);
    expect(numberIn(result, "twice.upper") - numberIn(result, "twice.lower")).toBeCloseToRelative(
      39.778,
      5e-3,
    );
    expect(rowsOf(result, "sensitivity").find(({ watched }) => watched === "none")).toMatchObject({
      rank_correlation: null,
      variance_share: null,
    });
  });

  it("draws a deviation that is a share of an uncertain name along with it", () => {
    const result = completedLast(["values", "given", "x = 100 ± 10 K\ny = x ± 50 %"], spread("watch = y"));
    expect(rowsOf(result, "inputs").map(({ input }) => input)).toEqual(["x", "y"]);
    expect(numberIn(result, "y.upper")).toBeCloseToRelative(150, 0.05);
  });

  it("takes log10 of what is positive and spans a factor 10", () => {
    const result = completedLast(
      ["values", "given", "v = 1 /m^3 within factor 5\nw = v * v"],
      spread("watch = v, w"),
    );
    expect(rowsOf(result, "sensitivity").map(({ scale }) => scale)).toEqual(["log10", "log10"]);
    const bins = rowsOf(result, "histogram").filter(({ watched }) => watched === "v");
    expect(bins.reduce((sum, row) => sum + numberOf(row, "count"), 0)).toBe(4096);
    const [first, second, third] = bins.map((row) => numberOf(row, "from"));
    expect(third / second).toBeCloseToRelative(second / first, 1e-9);
  });

  it("cuts a distribution where a number can't be, in proportion, and says so", () => {
    const cells: WrittenCell[] = [
      ["values", "given", "T_quiet = 100 ± 60 K\nx_O = 0.1 ± 0.1 %\nfree = 1 ± 1 K"],
      ...planet.slice(1, 2),
      [
        "column",
        "dayside",
        planet[2][2].replace("power(base = K_base, exponent = 0.5, ceiling = 1e8 cm^2/s)", "0 m^2/s"),
      ],
      spread("watch = dayside.top.altitude, T_quiet, x_O, free\nsamples = 64"),
    ];
    const result = completedLast(...cells);
    const inputs = rowsOf(result, "inputs");
    expect(inputs).toMatchObject([
      { input: "T_quiet", lower_bound: 1, upper_bound: null },
      { input: "x_O", lower_bound: 0, upper_bound: 1 },
      { input: "free", lower_bound: null, upper_bound: null },
    ]);
    const said = result.notes.filter(({ code }) => code === "cut_at_bounds").map(({ message }) => message);
    expect(said).toHaveLength(2);
    // Φ((1 − 100)/60) = Φ(−1.65) = 4.9 %; Φ(−1) = 16 %
    expect(said[0]).toMatch(/\*T_quiet\* is kept above 1.K; 4\.9 %/);
    expect(said[1]).toMatch(/\*x_O\* is kept between zero and 1; 16 %/);
    // Median of N(1, 1) cut at 0 in units of σ: Φ⁻¹(Φ(−1) + 0.5 (1 − Φ(−1))) = 0.20038 above the mean
    expect(numberIn(result, "x_O.median")).toBeCloseToRelative(0.001 * 1.20038, 0.03);
    expect(numberIn(result, "free.median")).toBeCloseToRelative(1, 0.05);
  });

  it("counts draws without an answer by their reason", () => {
    const result = completedLast(
      ["values", "given", "x = between -1 and 3 m\ny = sqrt(x)"],
      spread("watch = y\nsamples = 1024"),
    );
    expect(numberIn(result, "faulted_share")).toBeCloseToRelative(0.25, 0.01);
    expect(rowsOf(result, "outcomes")).toMatchObject([{ level: "fault", code: "domain", cell: "given" }]);
    expect(result.notes).toMatchObject([{ level: "caution", code: "without_answer" }]);
    // Of what is left, x is uniform from 0 to 3 m.
    expect(numberIn(result, "y.median")).toBeCloseToRelative(Math.sqrt(1.5), 0.01);
  });

  it("has no quantiles where no draw has an answer", () => {
    const result = completedLast(
      [
        "values",
        "given",
        "x = between 0 and 2 m\ny = 1 m\nz = sqrt(y - max(x - 1 m, 1 m - x) - 0.9999999 m)",
      ],
      spread("watch = z\nsamples = 64"),
    );
    expect(result.values).not.toHaveProperty(["z.median"]);
    expect(numberIn(result, "faulted_share")).toBeGreaterThan(0.9);
  });

  it("gives the watched results their spread in their own cell, and no other", () => {
    const cells = [...planet, spread("watch = leak.H2.rate, leak.exobase.altitude\nsamples = 128")];
    const [given, , dayside, leak, sure] = completed(cells);
    expect(leak.values["H2.rate"].spread).toEqual({
      ...Object.fromEntries(
        ["median", "lower", "upper", "q2_5", "q97_5"].map((name) => [
          name,
          sure.values[`leak.H2.rate.${name}`].value,
        ]),
      ),
      cell: "sure",
    });
    expect(leak.values["O.rate"]).not.toHaveProperty("spread");
    expect(codes(given)).not.toContain("acts_by_centre");
    expect(dayside.values["top.altitude"]).not.toHaveProperty("spread");
    expect(codes(resultOf(...planet.slice(0, 1)))).toContain("acts_by_centre");
  });

  it("leaves the remark on entries that no spread drew", () => {
    const [given] = completed([
      ["values", "given", "x = 1 ± 0.1 m\ny = 2 ± 0.1 m"],
      spread("watch = x\nsamples = 64"),
    ]);
    const remark = given.notes.find(({ code }) => code === "acts_by_centre");
    expect(remark?.message).toBe("*y* acts by its centre; results carry no ±.");
  });

  it("draws uncertain entries of other cells, under the name of the cell and the entry", () => {
    const result = completedLast(
      ["body", "ilmara", "mass = 0.41 ± 0.02 earth_mass\nradius = 4943 km"],
      spread("watch = ilmara.surface_gravity\nsamples = 64"),
    );
    expect(rowsOf(result, "inputs")).toMatchObject([{ input: "ilmara.mass", unit: "kg", lower_bound: 0 }]);
  });

  it("gives the same bits however it is shared out, other bits with another seed", () => {
    const cells = [...planet, spread("watch = leak.H2.rate\nsamples = 64")];
    const whole = answerInParts(cells, [64]);
    expect(answerInParts(cells, [1, 9, 30, 64])).toEqual(whole);
    const other = answerInParts([...planet, spread("watch = leak.H2.rate\nsamples = 64\nseed = 2")], [64]);
    expect(other.watched).not.toEqual(whole.watched);
    expect(answerInParts(cells, [20]).watched[0].values).toEqual(whole.watched[0].values.slice(0, 20));
  });

  it("marks what a stopped spread gives as partial, in its cell and in the results", () => {
    const cells: WrittenCell[] = [["values", "given", "x = 1 ± 0.1 m"], spread("watch = x\nsamples = 512")];
    const partial = answerInParts(cells, [100]);
    expect(partial.spreads.x).toMatchObject({ isPartial: true });
    expect(partial.values.draws.value).toBe(100);
    expect(partial.notes[0].message).toContain("first 100 of 512 draws");
  });
});

describe("a spread that cannot be computed, or only poorly, says why", () => {
  const values: WrittenCell = ["values", "given", "x = 240 ± 30 K\nc = 3 km"];
  it.each([
    ["watch = c", "fault", "nothing_uncertain", /such as 240 ± 30 K/],
    ["watch = nothing", "fault", "unknown_name", /No result above/],
    ["watch = x\nsamples = 1e7", "fault", "bound", /must be 1×10⁶ or less/],
    ["watch = x\nsamples = 8", "fault", "bound", /must be 64 or more/],
    ["watch = x\nsamples = 100.5", "fault", "whole_number", /must be a whole number/],
    ["watch = x\nsamples = 100 K", "fault", "dimension", /without unit/],
    ["watch = x\nseed = -1", "fault", "bound", /must be zero or more/],
    ["watch = x\nsamples = 100", "caution", "few_draws", /fewer than 512 draws/],
    ["samples = 4096", "fault", "missing_key", /\*watch\* is missing/],
    ["watch = x\nsampels = 4096", "fault", "unknown_key", /The nearest is \*samples\*/],
  ])("%s", (text, level, code, message) => {
    const note = resultOf(values, spread(text)).notes.find((each) => each.code === code);
    expect(note?.level).toBe(level);
    expect(note?.message).toMatch(message);
  });

  it("counts 128 uncertain entries as too few to refuse, and 129 as too many", () => {
    const entries = (count: number) => Array.from({ length: count }, (_, i) => `a${i} = 1 ± 0.1`).join("\n");
    const sum = (count: number) => `total = ${Array.from({ length: count }, (_, i) => `a${i}`).join(" + ")}`;
    const of = (count: number) =>
      completedLast(
        ["values", "given", `${entries(count)}\n${sum(count)}`],
        spread("watch = total\nsamples = 64"),
      );
    expect(numberIn(of(128), "total.median")).toBeCloseToRelative(128, 0.01);
    expect(codes(of(129))).toContain("too_many");
  });

  it("counts a draw as a fault where no part of an entry is possible in it", () => {
    const result = completedLast(
      ["values", "given", "q = between -1 and 3 kg"],
      ["body", "ilmara", "mass = q ± 0.01 kg\nradius = 1 m"],
      spread("watch = ilmara.mass\nsamples = 1024"),
    );
    expect(rowsOf(result, "outcomes")).toMatchObject([
      { level: "fault", code: "nothing_possible", cell: "ilmara" },
    ]);
    // Of q above −0.37 kg a part of the normal distribution, however small, lies above zero.
    expect(numberIn(result, "faulted_share")).toBeCloseToRelative(0.63 / 4, 0.03);
  });
});
