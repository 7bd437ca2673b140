/**
 * Signs that a caution can carry: ids and meanings of ISO 7010, in our words. The list is the part of the standard that repair work needs;
 * ids and meanings were read in a public file that quotes the standard, not in the standard itself.
 */
export const SIGNS: Readonly<Record<string, string>> = {
  W001: "general warning",
  W012: "electricity",
  W015: "overhead load",
  W017: "hot surface",
  W019: "crushing",
  W021: "flammable material",
  W023: "corrosive substance",
  W024: "crushing of hands",
  W026: "battery charging",
  W029: "pressurised cylinder",
  M002: "read the manual",
  M003: "wear ear protection",
  M004: "wear eye protection",
  M008: "wear safety footwear",
  M009: "wear gloves",
  M010: "wear protective clothing",
  M013: "wear a face shield",
  M016: "wear a mask",
  M017: "wear respiratory protection",
  M021: "disconnect before maintenance",
  P002: "no smoking",
  P003: "no open flame",
};
