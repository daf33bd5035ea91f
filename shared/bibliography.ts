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
} as const satisfies Record<string, Source>;

export type SourceKey = keyof typeof bibliography;
