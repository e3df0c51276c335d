import type { Adapter } from './adapter';
import { curveAt, generalisedAt, inverseOf, mirrorRule } from './curves';
import { abstention, alkeneFromOneJ } from './doubleBond';
import { inputGate } from './inputGate';
import { RELATION_IDS } from './relationIds';

/** Which adapter puts which relation of a check file to the product; a relation that is missing here is not covered. */
export const ADAPTERS: Readonly<Record<string, Adapter>> = {
  'Karplus 1963 form 7-cos+5cos2': curveAt(RELATION_IDS.karplus1963),
  'Karplus 1959': curveAt(RELATION_IDS.karplus1959),
  'three-term H-C-C-H 7.76/-1.10/1.40 (source not seen)': curveAt(RELATION_IDS.threeTerm776),
  'generalized Karplus set B': generalisedAt(RELATION_IDS.generalised),
  'generalized Karplus set C': generalisedAt(RELATION_IDS.generalised),
  'generalized Karplus set D': generalisedAt(RELATION_IDS.generalised),
  'generalized Karplus set E': generalisedAt(RELATION_IDS.generalised),
  'xi mirror rule': mirrorRule(RELATION_IDS.generalised),
  'inverse of 7-cos+5cos2 on 0-180': inverseOf(RELATION_IDS.karplus1963),
  'CH=CH stereochemistry from one J': alkeneFromOneJ,
  'input gate': inputGate,
  'honest abstention': abstention,
};
