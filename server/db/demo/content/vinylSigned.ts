import { type DemoCase, at } from '../story';
import { G, answer, conditions, content, doubleBond, eAndZ, evidence, reading } from './build';

const allSteps = ['reciprocity', 'domain', 'second-root', 'other-evidence', 'alternatives'] as const;

/** Vinyl linkers, the decided cases: two assigned, one signed as not decided, one superseded by a better measurement. */
export const vinylSigned: DemoCase[] = [
  {
    key: 'cinnamide-e', project: 'VNL', author: 'tomas', opened: at(58, '09:12'),
    content: content({
      question: 'N-Benzyl cinnamide VN-011: E or Z?',
      compound: { name: 'N-benzyl-3-phenylprop-2-enamide', batch: 'VN-011-2', notebook: 'TE-041-07', structureNote: 'PhCH=CH–C(O)NHCH2Ph from the acid chloride; one isomer by TLC.' },
      conditions: conditions('500.13', 'CDCl3', '298.0', '12 mM'),
      readings: [
        reading('r1', ['H2', 'H3'], '15.70', { se: '0.1', partner: '15.70', where: '6.42 ppm and 7.68 ppm', note: 'Read at both protons from the peak list.' }),
        reading('r2', ['NH', 'H1′'], '5.7', { se: '0.3', where: 'N–CH2, 4.55 ppm', note: 'Through N; kept as read, nothing is calculated from it.' }),
      ],
      calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: [G.amide, G.h] })],
      candidates: eAndZ(),
      evidence: [
        evidence('e1', 'other', 'neutral', null, 'Peak list and expansion of H3, from which J was read.'),
        evidence('e2', 'synthesis', 'for', 'e', 'Made from commercial trans-cinnamic acid; no light, no base beyond the amine.'),
      ],
      answer: answer('assigned', 'e', 'E. The two vinyl hydrogens are trans.', '15.7 Hz at both protons lies inside the trans class for two carbon groups and far from the cis class.'),
      tags: ['amide', 'warhead'],
    }),
    acts: [
      { at: at(58, '09:40'), act: 'attach', file: 'peakList', evidenceId: 'e1' },
      { at: at(58, '09:44'), act: 'attach', file: 'multiplet', evidenceId: 'e1' },
      { at: at(58, '10:05'), act: 'submit', dueInDays: -51 },
      { at: at(57, '08:30'), act: 'claim', by: 'amina' },
      { at: at(57, '08:41'), act: 'check', by: 'amina', steps: [...allSteps] },
      { at: at(57, '08:46'), act: 'sign', by: 'amina', meaning: 'review' },
    ],
  },
  {
    key: 'cinnamide-z', project: 'VNL', author: 'tomas', opened: at(51, '14:20'),
    content: content({
      question: 'Second isomer after irradiation of VN-011: Z?',
      compound: { name: 'N-benzyl-3-phenylprop-2-enamide, photolysate fraction 2', batch: 'VN-012-1', notebook: 'TE-041-15', structureNote: 'From VN-011 at 365 nm, 4 h; the minor spot, 3 mg.' },
      conditions: conditions('500.13', 'CDCl3', '298.0', '4 mM'),
      readings: [reading('r1', ['H2', 'H3'], '12.6', { partner: '12.5', where: '5.99 ppm and 6.80 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: [G.amide, G.h] })],
      candidates: eAndZ(),
      evidence: [evidence('e1', 'synthesis', 'for', 'z', 'Formed from the E isomer by light; the starting material shows 15.7 Hz.')],
      answer: answer('not-decided', null, '12.6 Hz lies between cis and trans.', '12.6 Hz lies between cis and trans for two carbon groups. The pair with VN-011 speaks for Z, but the pair is not scored here.',
        { leftOpen: 'An NOE between H2 and H3 on this sample would decide. Booked on the 600.' }),
      tags: ['amide', 'photochemistry'],
    }),
    acts: [
      { at: at(51, '15:02'), act: 'submit', dueInDays: -44 },
      { at: at(50, '09:10'), act: 'claim', by: 'amina' },
      { at: at(50, '09:18'), act: 'check', by: 'amina', steps: ['reciprocity', 'domain', 'second-root', 'alternatives'] },
      { at: at(50, '09:25'), act: 'query', by: 'amina', step: 'other-evidence', text: 'The pair 15.7 and 12.6 Hz is quoted in the reasons. Why is it not the answer?' },
      { at: at(50, '11:40'), act: 'reply', query: 1, text: 'Because fraction 2 may still hold an impurity: 3 mg and one extra singlet. I would rather see the NOE before the word Z stands in the record.' },
      { at: at(50, '11:52'), act: 'submit' },
      { at: at(50, '13:05'), act: 'close', by: 'amina', query: 1, text: 'Agreed.' },
      { at: at(50, '13:06'), act: 'check', by: 'amina', steps: [...allSteps] },
      { at: at(50, '13:10'), act: 'sign', by: 'amina', meaning: 'review' },
    ],
  },
  {
    key: 'crotonamide', project: 'VNL', author: 'tomas', opened: at(46, '10:00'),
    content: content({
      question: 'Crotonamide VN-021: E or Z?',
      compound: { name: 'N-(4-chlorobenzyl)but-2-enamide', batch: 'VN-021-1', notebook: 'TE-042-03', structureNote: 'CH3CH=CH–C(O)NHR.' },
      conditions: conditions('400.13', 'DMSO-d6', '300'),
      readings: [
        reading('r1', ['H2', 'H3'], '15,2', { partner: '15,3', where: '5.93 ppm and 6.62 ppm', note: 'Typed with the comma of the console.' }),
        reading('r2', ['H3', 'H4'], '6,9', { se: '0.2', partner: '6,8', where: 'CH3, 1.80 ppm' }),
        reading('r3', ['H2', 'H4'], '1.7', { se: '0.2', partner: '1.6', path: '4J', where: 'CH3, 1.80 ppm', note: 'Allylic; sign not measured.' }),
      ],
      calculations: [doubleBond('c1', 'r1', { left: [G.methyl, G.h], right: [G.amide, G.h] })],
      candidates: eAndZ(),
      answer: answer('assigned', 'e', 'E, trans across C-2 and C-3.', '15.2 Hz, read at both protons, is inside the trans class for two carbon groups.'),
      tags: ['amide'],
    }),
    acts: [
      { at: at(46, '10:31'), act: 'submit' },
      { at: at(45, '16:00'), act: 'claim', by: 'joris' },
      { at: at(45, '16:08'), act: 'check', by: 'joris', steps: [...allSteps] },
      { at: at(45, '16:12'), act: 'sign', by: 'joris', meaning: 'approval' },
    ],
  },
  {
    key: 'enone-first', project: 'VNL', author: 'tomas', opened: at(40, '13:30'),
    content: content({
      question: 'Styryl ketone VN-026: E or Z?',
      compound: { name: '4-(3-pyridyl)but-3-en-2-one', batch: 'VN-026-1', notebook: 'TE-042-19', structureNote: 'Aldol condensation, crude.' },
      conditions: conditions('300.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H3', 'H4'], 'ca. 16', { se: '', where: '6.77 ppm, crude spectrum', note: 'H4 under the aromatic signals.' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.ketone, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      answer: answer('tentative', 'e', 'E, as far as the crude tells.', 'About 16 Hz is trans for two carbon groups, but the error of 1 Hz reaches towards the open band.', { leftOpen: 'Read on the crude; to be repeated on the pure product.' }),
      tags: ['ketone', 'crude'],
    }),
    acts: [
      { at: at(40, '13:52'), act: 'submit' },
      { at: at(39, '09:00'), act: 'claim', by: 'amina' },
      { at: at(39, '09:09'), act: 'check', by: 'amina', steps: [...allSteps] },
      { at: at(39, '09:15'), act: 'sign', by: 'amina', meaning: 'review' },
      { at: at(30, '11:00'), act: 'supersede', reason: 'Measured again on the pure product at 600 MHz, both protons resolved.', successor: 'enone-second' },
    ],
  },
  {
    key: 'enone-second', project: 'VNL', author: 'tomas', opened: null,
    content: content({
      question: 'Styryl ketone VN-026: E or Z? Pure product',
      compound: { name: '4-(3-pyridyl)but-3-en-2-one', batch: 'VN-026-3', notebook: 'TE-043-01', structureNote: 'Recrystallised.' },
      conditions: conditions('600.30', 'CDCl3', '298', '15 mM'),
      readings: [reading('r1', ['H3', 'H4'], '16.32', { se: '0.05', partner: '16.30', where: '6.79 ppm and 7.51 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.ketone, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      answer: answer('assigned', 'e', 'E, trans across C-3 and C-4.', '16.3 Hz at both protons, on the pure product, replaces the crude reading.'),
      tags: ['ketone'],
    }),
    acts: [
      { at: at(30, '11:24'), act: 'submit' },
      { at: at(29, '10:15'), act: 'claim', by: 'amina' },
      { at: at(29, '10:22'), act: 'check', by: 'amina', steps: [...allSteps] },
      { at: at(29, '10:26'), act: 'sign', by: 'amina', meaning: 'review' },
    ],
  },
];
