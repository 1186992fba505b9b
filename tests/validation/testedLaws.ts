/** What is tested without a number from outside, and by which test. */
export interface TestedLaw {
  law: string;
  /** Under `tests/shared`. */
  file: string;
  /** Part of the name of the test. */
  test: string;
}

export const testedLaws: readonly TestedLaw[] = [
  {
    law: "The gases obey the equations of diffusion and eddy mixing at every altitude",
    file: "physics/column/columnEquations.test.ts",
    test: "hold to 1e-7 at every altitude",
  },
  {
    law: "The same column comes out by a slow route that shares no code",
    file: "physics/column/columnEquations.test.ts",
    test: "have the same solution by a slow route",
  },
  {
    law: "Pressure bears the weight of the gas above, to 1e-6, without flux and with",
    file: "physics/coupling/hydrostaticBalance.test.ts",
    test: "bears",
  },
  {
    law: "Each gas passes every altitude up to the exobase at one rate",
    file: "physics/coupling/coupledEquations.test.ts",
    test: "carries each gas at one rate through every altitude",
  },
  {
    law: "Above the exobase the gas stands without flux",
    file: "physics/coupling/coupledEquations.test.ts",
    test: "is hydrostatic without flux above it",
  },
  {
    law: "What leaves is the Jeans flux of the density that it leaves behind",
    file: "physics/coupling/coupledEquations.test.ts",
    test: "lets go at the exobase what its density there gives",
  },
  {
    law: "The coupled column comes out by collocation, another method for the same equations",
    file: "physics/coupling/boundaryValue.test.ts",
    test: "has the same solution by collocation",
  },
  {
    law: "Half the tolerance moves no number of a column by 1e-6",
    file: "physics/column/solveColumn.test.ts",
    test: "does not depend on its steps",
  },
  {
    law: "Half the tolerance moves no log₁₀ of a rate by 4e-7 and no other number by 1e-6",
    file: "physics/coupling/solveCoupledColumn.test.ts",
    test: "does not depend on its steps",
  },
  {
    law: "A trace gas with flux meets the closed form",
    file: "physics/coupling/coupledLimits.test.ts",
    test: "escapes at the rate of the closed form",
  },
  {
    law: "Strong escape ends at the diffusion limit, weak escape at the Jeans flux",
    file: "physics/coupling/coupledLimits.test.ts",
    test: "is Hunten's limit by diffusion where all leaves that comes",
  },
  {
    law: "Without mixing and flux, Walker's closed form holds, and each gas has its own scale height",
    file: "physics/column/columnLimits.test.ts",
    test: "has each gas on its own scale height",
  },
  {
    law: "With K without bound mixing ratios are constant",
    file: "physics/column/columnLimits.test.ts",
    test: "keeps its mixing ratios as K grows without bound",
  },
  {
    law: "The exobase lies where a closed form has it for one isothermal gas",
    file: "physics/exobase/findExobase.test.ts",
    test: "lies where a closed form has it",
  },
  {
    law: "The exobase rises with temperature, density and smaller molecules",
    file: "physics/exobase/findExobase.test.ts",
    test: "rises as the gas grows hotter",
  },
  {
    law: "More of a gas loses more of it, less than in proportion",
    file: "physics/coupling/solveCoupledColumn.test.ts",
    test: "loses more of a gas the more there is of it",
  },
  {
    law: "No trace loses more than the column without flux has it",
    file: "physics/coupling/solveCoupledColumn.test.ts",
    test: "never lets more of a trace go",
  },
  {
    law: "The order of the gases does not matter",
    file: "physics/coupling/solveCoupledColumn.test.ts",
    test: "does not depend on the order of the gases",
  },
  {
    law: "The Jeans flux is the Maxwellian integral, and n v̄/4 where nothing is bound",
    file: "physics/escape/effusionVelocity.test.ts",
    test: "agrees with the Maxwellian integral",
  },
  {
    law: "A transonic wind obeys its equation of motion in steps",
    file: "physics/limits/isothermalWind.test.ts",
    test: "satisfies the equation of motion",
  },
  {
    law: "The diffusion limit just uses up a light gas with height",
    file: "physics/limits/diffusionLimit.test.ts",
    test: "is the flux that just uses up a light gas",
  },
  {
    law: "The crossover mass is that which the drag of the flow just bears",
    file: "physics/limits/crossoverMass.test.ts",
    test: "is the mass whose weight the drag",
  },
  {
    law: "The energy limit lifts gas by the light that is caught, joule by joule",
    file: "physics/limits/energyLimitedMassRate.test.ts",
    test: "spends the light that meets the disc",
  },
  {
    law: "The content of a column is what its shells hold",
    file: "physics/limits/columnInventory.test.ts",
    test: "is the sum over thin shells",
  },
  {
    law: "Partition functions share out the bound orbits: ballistic + satellite = P(3/2, λ)",
    file: "physics/corona/partitionFunctions.test.ts",
    test: "share the bound ones out",
  },
  {
    law: "Escaping particles at the exobase are ½(1 − P), and there are no satellites",
    file: "physics/corona/partitionFunctions.test.ts",
    test: "leave no satellites at the exobase",
  },
  {
    law: "A corona is the sum over the orbits of a Maxwellian",
    file: "physics/corona/coronaDensity.test.ts",
    test: "is the sum over orbits",
  },
  {
    law: "Columns of a corona add up its density along the line",
    file: "physics/corona/coronaColumn.test.ts",
    test: "adds up the density along the line",
  },
  {
    law: "A loss is the integral over the ages by Simpson's rule, and adds up over spans",
    file: "physics/loss/equivalentTime.test.ts",
    test: "is the integral over the ages",
  },
  {
    law: "Escape by recombination adds up thin shells",
    file: "physics/nonthermal/recombinationEscape.test.ts",
    test: "adds up thin shells",
  },
  {
    law: "A picked-up ion runs through its cycloid",
    file: "physics/nonthermal/pickup.test.ts",
    test: "of how far an ion from rest swings",
  },
  {
    law: "Draws fill the unit cube evenly, and every point is uniform over scramblings",
    file: "physics/spread/scrambledSobol.test.ts",
    test: "makes every point uniform",
  },
  {
    law: "Sweeps answer what the notebook answers with that number written",
    file: "notebook/tasks/sweep.test.ts",
    test: "answers at each point what the notebook answers",
  },
  {
    law: "Sweeps and spreads give the same bits however they are shared out",
    file: "notebook/tasks/spread.test.ts",
    test: "gives the same bits however it is shared out",
  },
  {
    law: "Elementary functions agree with decimal arithmetic in 60 digits",
    file: "physics/numerics/elementary.test.ts",
    test: "exponential, ordinary arguments",
  },
];
