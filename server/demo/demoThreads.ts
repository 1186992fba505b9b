import type { DemoPerson } from "./demoNotebooks";

export interface DemoThread {
  /** Name of a cell of the draft. */
  cell: string;
  /** Oldest first. */
  comments: { by: DemoPerson; hoursAgo: number; text: string }[];
  resolvedBy?: DemoPerson;
}

/** Threads on the draft of Ilmara's dayside. */
export const ilmaraThreads: readonly DemoThread[] = [
  {
    cell: "dayside",
    comments: [
      {
        by: "w.castellane",
        hoursAgo: 51,
        text: "With $\\nu = 0.5$ the mixing meets a ceiling that nobody has measured. @Tamsin Orevale, does the ceiling do anything at all?",
      },
      {
        by: "t.orevale",
        hoursAgo: 49,
        text: "I would rather show it than say it: a sweep over `ceiling` belongs here. I will add one.",
      },
    ],
  },
  {
    cell: "leak",
    comments: [
      {
        by: "w.castellane",
        hoursAgo: 27,
        text: "Before this is vetted I should like a *word* in the text on why no correction of the Jeans rate is taken.",
      },
    ],
  },
  {
    cell: "given",
    comments: [
      {
        by: "t.orevale",
        hoursAgo: 75,
        text: "@Wiremu Castellane, is the factor of 2 on `K_base` one sigma or the whole range?",
      },
      { by: "w.castellane", hoursAgo: 74, text: "One sigma, from the scatter of the two years." },
    ],
    resolvedBy: "t.orevale",
  },
];
