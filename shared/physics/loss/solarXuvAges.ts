import { julianYear } from "../constants/iau";

/**
 * Ages, in s, of the youngest and the oldest star that the solar XUV law rests on: 0.1 and 6.7 Gyr, from memory of
 * [Ribas2005]. Outside them the law is carried beyond what was observed.
 */
export const solarXuvAges = { youngest: 0.1e9 * julianYear.value, oldest: 6.7e9 * julianYear.value } as const;
