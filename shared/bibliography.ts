/**
 * How a value came to us: `seen` = read in the work or in a page that quotes it; `memory` = recalled, to be checked before it is
 * quoted as fact; `ours` = our own reading or margin, no source.
 */
export type Standing = 'seen' | 'memory' | 'ours';

export interface Source {
  who: string;
  year: number;
  title: string;
  where: string;
  standing: Standing;
}

/** Every source that code or tests name, by key. Doc comments cite `[key]` with the equation, table or page. */
export const bibliography = {
  fao56: { who: 'Allen, Pereira, Raes, Smith', year: 1998, title: 'Crop evapotranspiration', where: 'FAO Irrigation and Drainage Paper 56, ch. 3 and annexes', standing: 'seen' },
  ashrae2017: { who: 'ASHRAE', year: 2017, title: 'Handbook: Fundamentals, ch. 1 Psychrometrics', where: 'eqs. 33 and 35; worked values as in the psychrolib tests', standing: 'seen' },
  stull2011: { who: 'Stull', year: 2011, title: 'Wet-bulb temperature from relative humidity and air temperature', where: 'J. Appl. Meteor. Climatol. 50:2267-2269', standing: 'seen' },
  turner1964: { who: 'Turner', year: 1964, title: 'A diffusion model for an urban area', where: 'J. Appl. Meteor. 3:83-91, as tabulated in [epa454]', standing: 'seen' },
  epa454: { who: 'US EPA', year: 2000, title: 'Meteorological Monitoring Guidance for Regulatory Modeling Applications', where: 'EPA-454/R-99-005, ch. 6', standing: 'seen' },
  amsGlossary: { who: 'American Meteorological Society', year: 2012, title: 'Glossary of Meteorology', where: 'entries: Richardson number, probability of precipitation, rain', standing: 'seen' },
  beaufort: { who: 'NBS table; WMO', year: 1970, title: 'Beaufort wind scale', where: 'as quoted by NASA Quest and delta-s.org', standing: 'seen' },
  yamartino1984: { who: 'Yamartino', year: 1984, title: 'A comparison of several single-pass estimators of the standard deviation of wind direction', where: 'J. Climate Appl. Meteor. 23:1362-1366, as in [epa454] §6.2.1', standing: 'memory' },
  haurwitz1945: { who: 'Haurwitz', year: 1945, title: 'Insolation in relation to cloudiness and cloud density', where: 'J. Meteor. 2:154-166; values as in the pvlib tests', standing: 'seen' },
  kastenCzeplak1980: { who: 'Kasten, Czeplak', year: 1980, title: 'Solar and terrestrial radiation dependent on the amount and type of cloud', where: 'Solar Energy 24:177-189', standing: 'memory' },
  beard1976: { who: 'Beard', year: 1976, title: 'Terminal velocity and shape of cloud and precipitation drops aloft', where: 'J. Atmos. Sci. 33:851-864', standing: 'memory' },
  gunnKinzer1949: { who: 'Gunn, Kinzer', year: 1949, title: 'The terminal velocity of fall for water droplets in stagnant air', where: 'J. Meteor. 6:243-248', standing: 'memory' },
  stokes1851: { who: 'Stokes', year: 1851, title: 'On the effect of the internal friction of fluids on the motion of pendulums', where: 'Trans. Camb. Phil. Soc. 9:8-106', standing: 'memory' },
  amsden1962: { who: 'Amsden', year: 1962, title: 'Reducing the evaporation of sprays', where: 'cited in Matthews, Pesticide Application Methods', standing: 'memory' },
  matthews: { who: 'Matthews, Bateman, Miller', year: 2014, title: 'Pesticide Application Methods', where: 'motorised knapsack mist blowers: median droplet about 50-150 µm', standing: 'memory' },
  asabeS572: { who: 'ASABE', year: 2020, title: 'S572.3 Spray nozzle classification by droplet spectra', where: 'comparative; size ranges differ between extension tables', standing: 'memory' },
  aez2024: { who: 'US EPA', year: 2024, title: 'Application exclusion zone amendments', where: '40 CFR 170.405, 89 FR 80767', standing: 'seen' },
  grdc103: { who: 'GRDC', year: 2025, title: 'Spray Application Manual, modules 10.3 and 10.8', where: 'Delta T as the evaporation guide; inversions', standing: 'seen' },
  bomDeltaT: { who: 'Australian Bureau of Meteorology', year: 2018, title: 'Delta T guidance: 2 to 8 ideal, not above 10', where: 'as repeated by local extension writers', standing: 'seen' },
  vicensBosch2000: { who: 'Vicens, Bosch', year: 2000, title: 'Weather-dependent pollinator activity in an apple orchard', where: 'Environ. Entomol. 29:413-420, by the USDA-ARS summary', standing: 'seen' },
  burrillDietz1981: { who: 'Burrill, Dietz', year: 1981, title: 'The response of honey bees to variations in solar radiation and temperature', where: 'as summarised in the COLOSS BEEBOOK', standing: 'seen' },
  winston1987: { who: 'Winston', year: 1987, title: 'The Biology of the Honey Bee', where: 'flight ends in wind of 24-34 km/h', standing: 'memory' },
  hennessy2020: { who: 'Hennessy et al.', year: 2020, title: 'Bees in wind', where: 'Anim. Behav., by a news summary', standing: 'seen' },
  karbassioon2023: { who: 'Karbassioon et al.', year: 2023, title: 'Responses in honeybee and bumblebee activity to changes in weather conditions', where: 'Oecologia', standing: 'seen' },
  boschKemp2001: { who: 'Bosch, Kemp', year: 2001, title: 'How to Manage the Blue Orchard Bee', where: 'forages from about 12-13 °C', standing: 'memory' },
  naturalistNote: { who: 'naturalist note', year: 2020, title: 'bumble bees from about 10 °C, honey bees from about 13 °C', where: 'weak source, figures widely repeated', standing: 'seen' },
  epa2013bees: { who: 'US EPA', year: 2013, title: 'Neonicotinoid label wording: not while bees are foraging; exception below 55 °F', where: 'label letter of August 2013', standing: 'memory' },
  brier1950: { who: 'Brier', year: 1950, title: 'Verification of forecasts expressed in terms of probability', where: 'Mon. Wea. Rev. 78:1-3', standing: 'memory' },
  murphy1973: { who: 'Murphy', year: 1973, title: 'A new vector partition of the probability score', where: 'J. Appl. Meteor. 12:595-600', standing: 'seen' },
  wilks1995: { who: 'Wilks', year: 1995, title: 'Statistical Methods in the Atmospheric Sciences', where: 'Table 7.3, as printed in the R package verification', standing: 'seen' },
  baskervilleEmin1969: { who: 'Baskerville, Emin', year: 1969, title: 'Rapid estimation of heat accumulation from maximum and minimum temperatures', where: 'Ecology 50:514-517; Zalom et al. 1983', standing: 'memory' },
  meeus1998: { who: 'Meeus', year: 1998, title: 'Astronomical Algorithms', where: 'chs. 15, 16, 25; computed by the package suncalc', standing: 'seen' },
  noaaSolar: { who: 'NOAA GML', year: 2023, title: 'Solar calculator', where: 'low-accuracy Meeus series', standing: 'memory' },
  redaAndreas2004: { who: 'Reda, Andreas', year: 2004, title: 'Solar position algorithm for solar radiation applications', where: 'NREL/TP-560-34302; values as in the pvlib tests', standing: 'seen' },
  usno2023: { who: 'US Naval Observatory', year: 2023, title: 'Rise and set for the Sun', where: 'table for 36.95 N 112.52 W', standing: 'seen' },
  panofskyDutton1984: { who: 'Panofsky, Dutton', year: 1984, title: 'Atmospheric Turbulence', where: 'gusts come down from above the surface layer', standing: 'memory' },
  windError: { who: 'public benchmark pages; NWS MOS verification', year: 2026, title: 'Mean error of hourly 10 m wind, about 1.5 m/s', where: 'low trust, lead time unstated', standing: 'seen' },
  nist44: { who: 'NIST', year: 2023, title: 'Handbook 44, appendix C: General tables of units of measurement', where: 'exact sizes of gallon, fluid ounce, pound, acre; also SP 811', standing: 'memory' },
  ncStateCalibration: { who: 'North Carolina State Extension', year: 2026, title: 'Christmas tree sprayer calibration worksheet', where: 'page of unknown year, read in 2026: 1/128-acre method, trees per acre, dose per tank', standing: 'seen' },
  mesaCalibration: { who: 'Mesa County Extension, Colorado', year: 2026, title: '1/128-acre calibration, handgun example', where: 'page of unknown year, read in 2026: 150 fl oz in 75 s', standing: 'seen' },
  albanyCalibration: { who: 'Albany County Extension, Wyoming', year: 2026, title: 'Boom sprayer formula GPA = 5940·GPM/(mph·W)', where: 'page of unknown year, read in 2026: 222 in, 3.75 gal/min, 5 mph give 20', standing: 'seen' },
  nafexCalibration: { who: 'NAFEX list', year: 2026, title: 'Spray volume from a measured area', where: 'page of unknown year, read in 2026: 1.5 gal on 1000 ft² give 65 gal/ac', standing: 'seen' },
  omafraMixing: { who: 'OMAFRA (Deveau); RealAgriculture', year: 2026, title: 'Tank-mix order and water pH', where: 'page of unknown year, read in 2026: WALES; captan half-life; not more than about three partners', standing: 'seen' },
  purduePpp122: { who: 'Whitford et al., Purdue Extension', year: 2018, title: 'Avoid tank mixing errors', where: 'PPP-122: fuller order, jar test', standing: 'memory' },
  hyndmanFan1996: { who: 'Hyndman, Fan', year: 1996, title: 'Sample quantiles in statistical packages', where: 'Am. Stat. 50:361-365, type 7', standing: 'memory' },
  cfr110: { who: 'USDA', year: 2006, title: '7 CFR Part 110, record keeping on restricted use pesticides', where: '§110.3; rescinded by the final rule of 12 May 2025 (FR Doc. 2025-08220), effective 11 July 2025', standing: 'seen' },
  cfr170: { who: 'US EPA', year: 2015, title: 'Worker Protection Standard', where: '40 CFR 170.311, 170.409, 170.411; two years of keeping seen in a page that quotes it, the rest from memory', standing: 'memory' },
  cfr171: { who: 'US EPA', year: 2017, title: 'Certification of pesticide applicators', where: '40 CFR 171.303(b)(7), by a compliance summary', standing: 'seen' },
  cfr156: { who: 'US EPA', year: 1992, title: 'Worker protection statements on labels', where: '40 CFR 156.208: default restricted-entry intervals', standing: 'memory' },
  waRecords: { who: 'Washington State', year: 2025, title: 'Pesticide application records', where: 'RCW 17.21.100, WAC 16-228-1320, by the department’s record page; list of the statute’s items from memory', standing: 'seen' },
  txRecords: { who: 'Texas Department of Agriculture', year: 2026, title: 'Pesticide application records', where: '4 TAC 7.33, read in 2026', standing: 'seen' },
  eu1107: { who: 'European Union', year: 2009, title: 'Regulation (EC) No 1107/2009, Art. 67', where: 'items by the preamble of [eu2023564]; three years of keeping from memory', standing: 'memory' },
  eu2023564: { who: 'European Union', year: 2023, title: 'Implementing Regulation (EU) 2023/564', where: 'content and format of plant protection records; by a trade note and EUR-Lex', standing: 'seen' },
  iracMoa: { who: 'Insecticide Resistance Action Committee', year: 2025, title: 'Mode of action classification v11.3', where: 'rules by the page on modes of action; table of groups from memory', standing: 'memory' },
  wilson1927: { who: 'Wilson', year: 1927, title: 'Probable inference, the law of succession, and statistical inference', where: 'J. Am. Stat. Assoc. 22:209-212', standing: 'memory' },
  newcombe1998: { who: 'Newcombe', year: 1998, title: 'Two-sided confidence intervals for the single proportion', where: 'Stat. Med. 17:857-872, method 3; formula as in the R package meta', standing: 'memory' },
  wald1947: { who: 'Wald', year: 1947, title: 'Sequential Analysis', where: 'binomial test; error bounds as restated by Binns, Nyrop, van der Werf', standing: 'memory' },
  binns2000: { who: 'Binns, Nyrop, van der Werf', year: 2000, title: 'Sampling and Monitoring in Crop Protection', where: '§5.4, sequential probability ratio test', standing: 'seen' },
  nistSequential: { who: 'NIST/SEMATECH', year: 2013, title: 'e-Handbook of Statistical Methods, sequential sampling plans', where: '§6.2.6, worked example', standing: 'memory' },
  abbott1925: { who: 'Abbott', year: 1925, title: 'A method of computing the effectiveness of an insecticide', where: 'J. Econ. Entomol. 18:265-267', standing: 'seen' },
  hendersonTilton1955: { who: 'Henderson, Tilton', year: 1955, title: 'Tests with acaricides against the brown wheat mite', where: 'J. Econ. Entomol. 48:157-161; formula as in calculators of trial efficacy', standing: 'memory' },
  cornellGdd: { who: 'Cornell IPM', year: 2020, title: 'Growing degree day updates 2019-20', where: 'ranges at base 50 °F', standing: 'seen' },
  msuTrees2024: { who: 'Michigan State University', year: 2024, title: 'Christmas tree pest report of 13 May 2024', where: 'balsam twig aphid', standing: 'seen' },
  msuCooley2015: { who: 'Michigan State University', year: 2015, title: 'Report on a Cooley spruce gall adelgid model', where: 'foliar spring window', standing: 'seen' },
  pennStateTrees: { who: 'Penn State Extension', year: 2026, title: 'Christmas tree pest guide', where: 'pages of unknown year, read in 2026: white pine weevil, tap test for mites', standing: 'seen' },
  rutgersGdd: { who: 'Rutgers', year: 2026, title: 'Growing degree day list', where: 'page of unknown year, read in 2026: European pine sawfly', standing: 'seen' },
  ncStateTrees: { who: 'North Carolina State Extension', year: 2026, title: 'Balsam twig aphid on Fraser fir', where: 'page of unknown year, read in 2026', standing: 'seen' },
  osuMidge: { who: 'Oregon State University', year: 2026, title: 'Douglas-fir needle midge', where: 'EM 9093, read in 2026', standing: 'seen' },
  rfc4180: { who: 'Shafranovich', year: 2005, title: 'Common format and MIME type for CSV files', where: 'RFC 4180 §2', standing: 'seen' },
  rfc8785: { who: 'Rundgren, Jordan, Erdtman', year: 2020, title: 'JSON canonicalization scheme', where: 'RFC 8785', standing: 'seen' },
  monteith1965: { who: 'Monteith', year: 1965, title: 'Evaporation and environment', where: 'Symp. Soc. Exp. Biol. 19:205-234: combination equation, here for a wet leaf', standing: 'memory' },
  steckelSimpson: { who: 'Steckel, Simpson, Univ. of Tennessee', year: 2017, title: 'June inversions on a hill and in a creek bottom', where: 'extension note; year from memory', standing: 'seen' },
  extensionInversion: { who: 'extension advice in AgProfessional; Hanna, Iowa State; label windows', year: 2019, title: 'Inversions end above 3 mph, 3 °F above the low, one hour after sunrise', where: 'trade-press summaries', standing: 'seen' },
} as const satisfies Record<string, Source>;

export type SourceKey = keyof typeof bibliography;
