/**
 * Whether two liquids of the catalogue mix in all proportions near room temperature: common practice, from memory (solvents of
 * the laboratory that every chart calls miscible, and pairs from which immersion liquids are made up: kerosene or mineral oil
 * with 1-chloro- or 1-bromonaphthalene, that with diiodomethane). No source was read for it, and the output says so. Pairs that
 * are merely likely are left out, and those that mix but may react: acetone with chloroform or its kin. Water taken up, additives
 * and cold make mixtures part.
 */
export const MISCIBILITY_BASIS = 'common practice, recalled from memory and not read in a source';

type Family =
  | 'water'
  | 'polyol'
  | 'methanol'
  | 'alcohol'
  | 'acetone'
  | 'acetonitrile'
  | 'sulfoxide'
  | 'benzene'
  | 'naphthalene'
  | 'chloroalkane'
  | 'carbon-disulfide'
  | 'diiodomethane'
  | 'alkane'
  | 'oil'
  | 'silicone'
  | 'fluorocarbon';

const FAMILIES: Readonly<Record<string, Family>> = {
  water: 'water',
  'heavy-water': 'water',
  glycerol: 'polyol',
  'ethylene-glycol': 'polyol',
  methanol: 'methanol',
  ethanol: 'alcohol',
  '1-propanol': 'alcohol',
  '2-propanol': 'alcohol',
  acetone: 'acetone',
  acetonitrile: 'acetonitrile',
  'dimethyl-sulfoxide': 'sulfoxide',
  benzene: 'benzene',
  toluene: 'benzene',
  '1-methylnaphthalene': 'naphthalene',
  '1-chloronaphthalene': 'naphthalene',
  '1-bromonaphthalene': 'naphthalene',
  chloroform: 'chloroalkane',
  dichloromethane: 'chloroalkane',
  'carbon-tetrachloride': 'chloroalkane',
  'carbon-disulfide': 'carbon-disulfide',
  diiodomethane: 'diiodomethane',
  cyclohexane: 'alkane',
  'n-hexane': 'alkane',
  isooctane: 'alkane',
  'n-hexadecane': 'oil',
  'trans-decalin': 'oil',
  kerosene: 'oil',
  'mineral-oil': 'oil',
  'silicone-fluid': 'silicone',
  'silicone-fluid-200': 'silicone',
  'fc-72': 'fluorocarbon',
};

/** For each family the families it mixes with; every pair once. */
const MIXES: Readonly<Record<Family, readonly Family[]>> = {
  water: ['water', 'polyol', 'methanol', 'alcohol', 'acetone', 'acetonitrile', 'sulfoxide'],
  polyol: ['polyol', 'methanol', 'alcohol', 'sulfoxide'],
  methanol: ['alcohol', 'acetone', 'acetonitrile', 'sulfoxide', 'benzene', 'chloroalkane'],
  alcohol: ['alcohol', 'acetone', 'acetonitrile', 'sulfoxide', 'benzene', 'chloroalkane', 'alkane'],
  acetone: ['acetonitrile', 'sulfoxide', 'benzene', 'alkane'],
  acetonitrile: ['benzene', 'chloroalkane'],
  sulfoxide: ['benzene'],
  benzene: [
    'benzene',
    'naphthalene',
    'chloroalkane',
    'carbon-disulfide',
    'diiodomethane',
    'alkane',
    'oil',
    'silicone',
  ],
  naphthalene: ['naphthalene', 'diiodomethane', 'alkane', 'oil'],
  chloroalkane: ['chloroalkane', 'carbon-disulfide', 'alkane', 'oil'],
  'carbon-disulfide': ['alkane'],
  diiodomethane: [],
  alkane: ['alkane', 'oil', 'silicone'],
  oil: ['oil'],
  silicone: ['silicone'],
  fluorocarbon: [],
};

/** True where they are known to mix in all proportions; false where nothing is known, they part or they may react. */
export function mixes(keyA: string, keyB: string): boolean {
  const a = FAMILIES[keyA];
  const b = FAMILIES[keyB];
  if (a === undefined || b === undefined) return false;
  return MIXES[a].includes(b) || MIXES[b].includes(a);
}
