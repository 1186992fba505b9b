/**
 * Semantic version of the physics with its handbook, kept with each version's results. Patch: no number moves by
 * more than 1e-9. Minor: numbers move or appear. Major: a name or a meaning changes.
 */
export const engineVersion = "1.1.0";
