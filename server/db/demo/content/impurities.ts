import { type DemoCase, at } from '../story';
import { G, angle, answer, candidate, conditions, content, doubleBond, eAndZ, evidence, geometry, reading, singleBond } from './build';

const allSteps = ['reciprocity', 'domain', 'second-root', 'other-evidence', 'alternatives'] as const;

/** Batch impurities: the same questions asked of what should not be there. */
export const impurities: DemoCase[] = [
  {
    key: 'hexenyl', project: 'IMP', author: 'amina', opened: at(44, '08:40'),
    content: content({
      question: 'Impurity at 6.4 min: E or Z hexenyl ester?',
      compound: { name: 'hex-3-enyl 4-nitrobenzoate', batch: 'B-1042', notebook: 'AR-021-03', structureNote: 'Isolated by preparative HPLC, 2 mg.' },
      conditions: conditions('600.30', 'CDCl3', '298', '5 mM'),
      readings: [
        reading('r1', ['H3', 'H4'], '10.8', { se: '0.1', partner: '10.8', where: '5.36 ppm and 5.54 ppm', note: 'With homonuclear decoupling of both CH2.' }),
        reading('r2', ['H2', 'H3'], '7.2', { partner: '7.2', where: '2.52 ppm' }),
      ],
      calculations: [doubleBond('c1', 'r1', { left: [G.ethylChain, G.h], right: [G.ethylChain, G.h] })],
      candidates: eAndZ(),
      evidence: [evidence('e1', 'synthesis', 'for', 'z', 'The alcohol of this batch was leaf alcohol, (Z)-hex-3-en-1-ol.')],
      answer: answer('assigned', 'z', 'Z, as in leaf alcohol.', '10.8 Hz between two carbon groups is inside the cis class and far from trans.'),
      tags: ['HPLC', 'ester'],
    }),
    acts: [
      { at: at(44, '09:15'), act: 'submit' },
      { at: at(43, '10:30'), act: 'claim', by: 'tomas' },
      { at: at(43, '10:44'), act: 'check', by: 'tomas', steps: [...allSteps] },
      { at: at(43, '10:50'), act: 'sign', by: 'tomas', meaning: 'review' },
      { at: at(28, '16:20'), act: 'addendum', text: 'Batch B-1051 shows the same impurity with 10.7 Hz; the ester peak in HPLC is at the same time.' },
    ],
  },
  {
    key: 'cinnamic', project: 'IMP', author: 'amina', opened: at(37, '13:00'),
    content: content({
      question: 'Acid impurity in B-1047: E or Z cinnamic acid?',
      compound: { name: '3-(4-fluorophenyl)prop-2-enoic acid', batch: 'B-1047', notebook: 'AR-021-09', structureNote: 'Hydrolysis product of the amide.' },
      conditions: conditions('400.13', 'DMSO-d6', '298'),
      readings: [reading('r1', ['H2', 'H3'], '16.0', { partner: '16.0', where: '6.49 ppm and 7.58 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: [G.ester, G.h] })],
      candidates: eAndZ(),
      answer: answer('assigned', 'e', 'E, trans across C-2 and C-3.', '16.0 Hz at both protons is trans for two carbon groups.'),
      tags: ['acid'],
    }),
    acts: [
      { at: at(37, '13:25'), act: 'submit' },
      { at: at(36, '11:00'), act: 'claim', by: 'joris' },
      { at: at(36, '11:06'), act: 'check', by: 'joris', steps: [...allSteps] },
      { at: at(36, '11:09'), act: 'sign', by: 'joris', meaning: 'approval' },
    ],
  },
  {
    key: 'recalled', project: 'IMP', author: 'amina', opened: at(32, '09:00'),
    content: content({
      question: 'Impurity at 8.1 min: geometry of the enoate?',
      compound: { name: 'ethyl 4-phenylbut-2-enoate', batch: 'B-1049', notebook: 'AR-021-14', structureNote: 'By GC and MS; NMR on the enriched fraction.' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H2', 'H3'], '15.5', { partner: '15.6', where: '5.82 ppm and 7.09 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.ester, G.h], right: [G.ethylChain, G.h] })],
      candidates: eAndZ(),
      answer: answer('assigned', 'e', 'E, trans across C-2 and C-3.', '15.5 Hz is trans for two carbon groups.'),
      tags: ['ester'],
    }),
    acts: [
      { at: at(32, '09:20'), act: 'submit' },
      { at: at(31, '10:00'), act: 'claim', by: 'tomas' },
      { at: at(31, '10:05'), act: 'check', by: 'tomas', steps: [...allSteps] },
      { at: at(31, '10:08'), act: 'sign', by: 'tomas', meaning: 'review' },
      { at: at(27, '15:00'), act: 'withdraw', by: 'joris', reason: 'The fraction was a mixture of two batches; the question is asked again on a clean one.' },
    ],
  },
  {
    key: 'ring-enone', project: 'IMP', author: 'amina', opened: at(10, '10:20'),
    content: content({
      question: 'Cyclic enone in B-1058: five- or six-membered ring?',
      compound: { name: '4,4-dimethyl cyclic enone', batch: 'B-1058', notebook: 'AR-022-06', structureNote: 'CH=CH–C(=O) in a ring; GC trace only.' },
      conditions: conditions('500.13', 'CDCl3', '298', '3 mM'),
      readings: [reading('r1', ['H2', 'H3'], '5.7', { partner: '5.7', where: '6.04 ppm and 7.46 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.ketone, G.h], right: ['C(C,C,C)', G.h] }, 5), doubleBond('c2', 'r1', { left: [G.ketone, G.h], right: ['C(C,C,C)', G.h] }, 6)],
      candidates: [candidate('five', 'cyclopent-2-enone', []), candidate('six', 'cyclohex-2-enone', [])],
      evidence: [evidence('e1', 'other', 'for', 'five', 'GC and MS: M⁺ 110, as for the dimethylcyclopentenone.')],
      answer: answer('not-decided', null, 'The coupling does not tell the ring size.', 'The bond is cis in either ring, so there is no E or Z to ask for. 5.7 Hz is the range of a five-membered ring; ring size is not something this calculation scores.',
        { leftOpen: 'Carbonyl shift in the 13C spectrum, or an authentic sample.' }),
      tags: ['ring', 'ketone'],
    }),
    acts: [{ at: at(10, '11:00'), act: 'submit', dueInDays: 5 }],
  },
  {
    key: 'renamed', project: 'IMP', author: 'amina', opened: at(15, '14:30'),
    content: content({
      question: 'Late impurity in B-1055: which styrene?',
      compound: { name: 'unknown 11.2 min', batch: 'B-1055', notebook: 'AR-022-01', structureNote: '' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H1', 'H2'], '16.4', { partner: '16.3', where: '6.42 ppm and 6.98 ppm' })],
      calculations: [doubleBond('c1', 'r1', null)],
      candidates: eAndZ(),
      tags: ['HPLC'],
    }),
    acts: [
      { at: at(14, '09:12'), act: 'save', change: (content) => ({ ...content, compound: { ...content.compound, name: 'methoxystilbene, isomer not known', structureNote: 'M⁺ 210 by LC–MS.' } }) },
      { at: at(13, '16:45'), act: 'save', change: (content) => ({
        ...content,
        compound: { ...content.compound, name: '4-methoxystilbene' },
        calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: [G.aryl, G.h] })],
      }) },
    ],
  },
  {
    key: 'reopened', project: 'IMP', author: 'amina', opened: at(11, '08:30'),
    content: content({
      question: 'Nitrile by-product in B-1057: E or Z?',
      compound: { name: '3-(2-naphthyl)prop-2-enenitrile', batch: 'B-1057', notebook: 'AR-022-04', structureNote: 'Dehydrated amide.' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H2', 'H3'], '12.1', { partner: '12.0', where: '5.51 ppm and 7.28 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.nitrile, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      answer: answer('not-decided', null, '12.1 Hz lies between cis and trans.', '12.1 Hz is in the open band for two carbon groups.', { leftOpen: 'The other isomer, or an NOE.' }),
      tags: ['nitrile'],
    }),
    acts: [
      { at: at(11, '09:00'), act: 'submit' },
      { at: at(10, '17:30'), act: 'reopen' },
      { at: at(9, '10:15'), act: 'save', reason: 'Second spectrum at 600 MHz with the minor isomer in the same tube.', change: (content) => ({
        ...content,
        readings: [...content.readings, reading('r2', ['H2′', 'H3′'], '16.6', { partner: '16.7', where: '5.94 ppm and 7.54 ppm', note: 'Minor isomer, 8 %, in the same tube.' })],
        calculations: [...content.calculations, doubleBond('c2', 'r2', { left: [G.nitrile, G.h], right: [G.aryl, G.h] })],
        candidates: [
          candidate('zmajor', 'major Z, minor E', [geometry('c1', 'cis'), geometry('c2', 'trans')]),
          candidate('emajor', 'major E, minor Z', [geometry('c1', 'trans'), geometry('c2', 'cis')]),
        ],
        answer: null,
      }) },
    ],
  },
  {
    key: 'chloride', project: 'IMP', author: 'amina', opened: at(13, '13:10'),
    content: content({
      question: 'Chlorohydrin in B-1056: cis or trans on the ring?',
      compound: { name: '2-chlorocyclohexan-1-ol', batch: 'B-1056', notebook: 'AR-022-02', structureNote: 'From the epoxide and chloride in work-up.' },
      conditions: conditions('400.13', 'CDCl3', '298', '25 mM'),
      readings: [
        reading('r1', ['H1', 'H2'], '9.3', { partner: '9.4', where: '3.50 ppm and 3.72 ppm' }),
        reading('r2', ['H1', 'H6ax'], '11.1', { se: '0.3', where: '3.50 ppm' }),
      ],
      calculations: [singleBond('c1', 'r1', { front: [G.ethylChain, G.hydroxy], rear: ['Cl', G.ethylChain] }, 'ring', 'vicinal-hh/karplus-1963')],
      candidates: [candidate('trans', 'trans', [angle('c1', 150, 210)], 'Both groups equatorial.'), candidate('cis', 'cis', [angle('c1', 40, 75)], 'One group axial.')],
      answer: answer('tentative', 'trans', 'trans, both groups equatorial.', '9.3 Hz needs two axial hydrogens.',
        { overrideReason: 'The calculation leaves most angles open; 11.1 Hz from H1 to H6ax shows beside it that H1 is axial.' }),
      tags: ['ring', 'halide'],
    }),
    acts: [
      { at: at(13, '13:55'), act: 'submit', dueInDays: -2 },
      { at: at(2, '09:00'), act: 'claim', by: 'joris' },
      { at: at(2, '09:12'), act: 'check', by: 'joris', steps: ['reciprocity'] },
      { at: at(2, '09:20'), act: 'query', by: 'joris', step: 'domain', text: 'The plain form was chosen on a carbon with chlorine and one with oxygen. Why not the generalised equation?' },
      { at: at(2, '09:23'), act: 'query', by: 'joris', step: 'second-root', text: 'The plain form also has a root near 0 to 30°. What excludes it in this ring?' },
    ],
  },
];
