/**
 * Whether two liquids of the catalogue mix in all proportions near room temperature, as the miscibility charts of common
 * solvents say (from memory). A chart is no promise: water taken up, additives and cold make mixtures part.
 */
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
  'sea-water': 'water',
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
  alcohol: [
    'alcohol',
    'acetone',
    'acetonitrile',
    'sulfoxide',
    'benzene',
    'naphthalene',
    'chloroalkane',
    'alkane',
  ],
  acetone: [
    'acetonitrile',
    'sulfoxide',
    'benzene',
    'naphthalene',
    'chloroalkane',
    'carbon-disulfide',
    'alkane',
  ],
  acetonitrile: ['sulfoxide', 'benzene', 'chloroalkane'],
  sulfoxide: ['benzene', 'chloroalkane'],
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
  naphthalene: ['naphthalene', 'chloroalkane', 'carbon-disulfide', 'diiodomethane', 'alkane', 'oil'],
  chloroalkane: ['chloroalkane', 'carbon-disulfide', 'diiodomethane', 'alkane', 'oil', 'silicone'],
  'carbon-disulfide': ['alkane', 'oil'],
  diiodomethane: [],
  alkane: ['alkane', 'oil', 'silicone'],
  oil: ['oil'],
  silicone: ['silicone'],
  fluorocarbon: [],
};

/** True where the charts say that they mix in all proportions; false where nothing is known or they part. */
export function mixes(keyA: string, keyB: string): boolean {
  const a = FAMILIES[keyA];
  const b = FAMILIES[keyB];
  if (a === undefined || b === undefined) return false;
  return MIXES[a].includes(b) || MIXES[b].includes(a);
}

/** Whether anything is known of the liquid at all. */
export const hasMiscibility = (key: string): boolean => key in FAMILIES;
