/** What every page and every export says of how far its numbers go. */
export const cautionText =
  "Results rest on a stationary one-dimensional model without chemistry. Tenuity is for research. Its numbers are not " +
  "for decisions on satellite drag, re-entry, launch or collision avoidance, where the responsible agency’s models and " +
  "licensed practice apply.";
