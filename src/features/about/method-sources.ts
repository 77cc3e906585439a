/** Where each part of the method is published. Rules of thumb for cutting have no such source and are marked so. */
export const methodSources = [
  { what: "Thickness bands", source: "ISO 3, preferred numbers, series R10" },
  {
    what: "Quantiles",
    source: "Harrell and Davis (1982), Biometrika 69(3), 635-640; with weights: Akinshin (2023), arXiv:2304.07265",
  },
  { what: "Weights", source: "Kish (1965), Survey Sampling, Wiley" },
  { what: "Far-out values", source: "Tukey (1977), Exploratory Data Analysis, Addison-Wesley" },
  {
    what: "Curves on the strips",
    source: "Sheather and Jones (1991), Journal of the Royal Statistical Society B 53(3), 683-690",
  },
  { what: "Standing", source: "Fritsch and Carlson (1980), SIAM Journal on Numerical Analysis 17(2), 238-246" },
  { what: "Ranges", source: "NIST/SEMATECH e-Handbook of Statistical Methods, doi:10.18434/M32189" },
  { what: "Quorum", source: "FCSM Statistical Policy Working Paper 22, the threshold rule" },
  {
    what: "Differencing",
    source: "Hundepool and others (2012), Statistical Disclosure Control, Wiley",
  },
  { what: "Tails", source: "ABS DataLab output rules: fewest contributors behind a quantile" },
] as const;
