import { entry, optional, row, type ExplanationRecord } from "./record";

const samples = entry("N", "draws asked for", "samples");
const seed = entry("\\text{seed}", "seed of the draws", "seed");

const quantile = {
  physics: "spread/sampleQuantile.ts#sampleQuantile",
  conventions: ["draws", "faultedDraws"],
  sources: ["HyndmanFan1996", "Owen1995"],
  validity:
    "the uncertain entries as they are written, each drawn by itself; what the models leave out is not in it.",
  notes: ["few_draws", "beyond_magnitude", "cut_at_bounds"],
} as const;

const quantiles = [
  { id: "median", words: "Median of RESULT", symbol: "x_{50\\,\\%}", p: "0.5" },
  { id: "lower", words: "Quantile of 16 % of RESULT", symbol: "x_{16\\,\\%}", p: "0.16" },
  { id: "upper", words: "Quantile of 84 % of RESULT", symbol: "x_{84\\,\\%}", p: "0.84" },
  { id: "q2_5", words: "Quantile of 2.5 % of RESULT", symbol: "x_{2.5\\,\\%}", p: "0.025" },
  { id: "q97_5", words: "Quantile of 97.5 % of RESULT", symbol: "x_{97.5\\,\\%}", p: "0.975" },
];

const quantileExplanations = quantiles.flatMap(({ id, words, symbol, p }): ExplanationRecord[] => [
  {
    ...quantile,
    id: `spread_${id}`,
    name: `RESULT.${id}`,
    words,
    symbol,
    formula: `P(x \\le ${symbol}) = ${p}`,
    with: [samples, seed],
  },
  {
    ...quantile,
    id: `spread_${id}_error`,
    name: `RESULT.${id}_error`,
    words: `Standard error: ${words.charAt(0).toLowerCase()}${words.slice(1)}`,
    symbol: "s",
    formula: "s = \\sqrt{\\frac{1}{R (R-1)} \\sum_{r=1}^{R} (x_r - \\bar x)^2}",
    with: [samples, seed],
    physics: "spread/scrambledSobol.ts#scrambledSobol",
    sources: ["Owen1995"],
  },
]);

/** Results of a spread cell, and the columns of its table `sensitivity`. */
export const spreadExplanations: readonly ExplanationRecord[] = [
  ...quantileExplanations,
  {
    ...quantile,
    id: "spread_draws",
    name: "draws",
    words: "Draws that were computed",
    symbol: "N",
    formula: "u_k \\in [0, 1)^d, \\qquad x_k = F^{-1}(u_k)",
    with: [samples, seed],
    physics: "spread/scrambledSobol.ts#scrambledSobol",
    sources: ["Owen1995", "JoeKuo2008"],
  },
  {
    id: "spread_faulted_share",
    name: "faulted_share",
    words: "Share of the draws with a fault",
    symbol: "N_\\mathrm{fault} / N",
    formula: null,
    with: [samples],
    physics: null,
    conventions: ["faultedDraws"],
    sources: [],
    validity: null,
  },
  {
    id: "spread_rank_correlation",
    name: "sensitivity.rank_correlation",
    words: "Rank correlation of the entry and the result",
    symbol: "\\rho",
    formula: "\\rho = \\mathrm{corr}\\left(\\mathrm{rank}\\, x, \\mathrm{rank}\\, y\\right)",
    with: [row("y", "result", "watched"), row("x", "entry", "input")],
    physics: "spread/rankCorrelation.ts#rankCorrelation",
    conventions: ["draws"],
    sources: ["Spearman1904"],
    validity: "a result that rises or falls with the entry throughout.",
  },
  {
    id: "spread_variance_share",
    name: "sensitivity.variance_share",
    words: "Share of the variance that the entry alone explains",
    symbol: "S",
    formula: "S = \\frac{\\mathrm{Var}\\left(E[y \\mid x]\\right)}{\\mathrm{Var}(y)}",
    with: [row("y", "result", "watched"), row("x", "entry", "input"), row("\\text{scale}", "scale", "scale")],
    physics: "spread/varianceShare.ts#varianceShare",
    conventions: ["draws"],
    sources: ["Sobol1993", "Plischke2013"],
    validity: "entries drawn each by itself; what they do only together is in no share.",
  },
];

/** Columns of the table `rows` of a sweep: each is a result, or what is varied. */
export const sweepExplanations: readonly ExplanationRecord[] = [
  {
    id: "sweep_point",
    name: "rows.RESULT",
    words: "RESULT at that point",
    symbol: "y(x)",
    formula: null,
    with: [
      entry("x", "varied", "vary"),
      optional(entry("x_2", "varied as well", "against")),
      entry("y", "watched", "watch"),
    ],
    physics: null,
    conventions: ["sweepPoints"],
    sources: [],
    validity: "the whole notebook, computed anew at the point as if the varied entry had been written so.",
  },
];
