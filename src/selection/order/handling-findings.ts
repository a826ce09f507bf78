/** Humidity, hazards, cleaning: what bites after the part has arrived. */
import type { Material } from '../../catalog/types.ts';
import { materialFacts } from '../material-facts.ts';
import { type Finding, facts } from './finding.ts';
import { number } from './shown-numbers.ts';

/** Below this Knoop number dust scratches and cloths do. */
const SOFT_KNOOP = 150;
const SOFT = ': soft, scratches when wiped dry: blow, then drag a tissue wet with solvent once, no rubbing';
const SOFT_AND_SOLUBLE =
  ': soft and harmed by water: gloves, blow only; if it must be, a tissue wet with a water-free solvent, once';
const NO_WATER = ': harmed by water: gloves, water-free solvents only';
/** More than this dissolves in 100 g of water: no bare surface lasts. */
const SOLUBLE_g = 1;

export function handlingFindings(material: Material): readonly Finding[] {
  const { hygroscopic, hazard, hazardLevel, care, knoop, solubility_g_per_100g, factsSource } =
    materialFacts(material);
  const base = { about: material.key, source: facts(factsSource) };
  const solubility =
    solubility_g_per_100g === null ? '' : `; ${number(solubility_g_per_100g)} g dissolve in 100 g of water`;
  const soluble = (solubility_g_per_100g ?? 0) > SOLUBLE_g;
  const humidity: Finding =
    hygroscopic === null
      ? { ...base, topic: 'humidity', level: 'look', text: 'nothing on file about moisture: ask' }
      : hygroscopic === 'no' && !soluble
        ? { ...base, topic: 'humidity', level: 'fine', text: `not hygroscopic by its entry${solubility}` }
        : {
            ...base,
            topic: 'humidity',
            level: 'look',
            text: `hygroscopic (${hygroscopic})${solubility}: specify dry packing, a sealed or purged mount or a moisture barrier, and who keeps it dry`,
          };
  const danger: Finding =
    hazard === null
      ? {
          ...base,
          topic: 'hazard',
          level: 'fine',
          text: 'no hazard on file, which is no statement that there is none: read the safety data sheet',
        }
      : {
          ...base,
          topic: 'hazard',
          level: 'look',
          text: `${hazardLevel === 'toxic' && !/toxic/i.test(hazard) ? 'toxic: ' : ''}${hazard}; get the safety data sheet and settle disposal before it arrives`,
        };
  const soft = knoop !== null && knoop < SOFT_KNOOP;
  const hardness = knoop === null ? 'hardness not on file' : `Knoop ${number(knoop)}`;
  const wet = soluble || hygroscopic === 'yes';
  const advice = soft ? (wet ? SOFT_AND_SOLUBLE : SOFT) : wet ? NO_WATER : '';
  const handling: Finding = {
    ...base,
    topic: 'handling',
    level: soft || care !== null ? 'look' : 'fine',
    text: [`${hardness}${advice}`, ...(care === null ? [] : [care])].join('; '),
  };
  return [humidity, danger, handling];
}
