/** What is tested without a number from outside, and where. */
export const laws = "";
