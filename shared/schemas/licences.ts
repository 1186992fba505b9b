/** Open licences to choose from; common practice for data and text of research. */
export const openLicences = ["CC BY 4.0", "CC BY-SA 4.0", "CC0 1.0", "ODC-BY 1.0", "ODbL 1.0"] as const;
