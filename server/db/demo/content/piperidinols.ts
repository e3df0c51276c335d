import { type DemoCase, at } from '../story';
import { G, angle, answer, candidate, conditions, content, evidence, reading, singleBond } from './build';

const allSteps = ['reciprocity', 'domain', 'second-root', 'other-evidence', 'alternatives'] as const;

/*
 * H3 and H4 of a 4-substituted piperidin-3-ol, seen from C-3 to C-4. The two diastereomers differ in how the groups sit
 * around C-4, so each has a calculation of its own: in the trans isomer C-2 and C-5 are gauche with both H axial (φ near 180°),
 * in the cis isomer H4 is equatorial (φ near −60°).
 */
const c3: [string, string] = [G.ch2N, G.hydroxy];
const transAt = (group: string) => ({ front: c3, rear: [group, G.ethylChain] as [string, string] });
const cisAt = (group: string) => ({ front: c3, rear: [G.ethylChain, group] as [string, string] });
const cisAndTrans = () => [
  candidate('trans', '3,4-trans', [angle('c1', 155, 205)], 'Both groups equatorial, H3 and H4 axial.'),
  candidate('cis', '3,4-cis', [angle('c2', -75, -40)], 'One group axial; H3 axial and H4 equatorial, or the other chair.'),
];

/** Piperidinol series: angles from H–C–C–H in and off the ring. */
export const piperidinols: DemoCase[] = [
  {
    key: 'methyl-trans', project: 'PIP', author: 'tomas', opened: at(55, '10:15'),
    content: content({
      question: '4-Methylpiperidin-3-ol PP-003: 3,4-cis or trans?',
      compound: { name: '1-benzyl-4-methylpiperidin-3-ol, isomer A', batch: 'PP-003-1', notebook: 'TE-040-11', structureNote: 'First eluting isomer from the hydroboration.' },
      conditions: conditions('500.13', 'CDCl3', '298', '18 mM'),
      readings: [
        reading('r1', ['H3', 'H4'], '9.6', { partner: '9.6', where: '3.21 ppm, td' }),
        reading('r2', ['H2ax', 'H3'], '9.9', { partner: '9.8', where: '1.81 ppm, dd', note: 'The other large splitting of H3.' }),
        reading('r3', ['H2eq', 'H3'], '4.4', { partner: '4.5', where: '3.03 ppm, ddd' }),
      ],
      calculations: [singleBond('c1', 'r1', transAt(G.methyl), 'ring'), singleBond('c2', 'r1', cisAt(G.methyl), 'ring')],
      candidates: cisAndTrans(),
      evidence: [evidence('e1', 'other-coupling', 'for', 'trans', 'H3 carries a second large splitting, 9.9 Hz to H2ax: H3 is axial.')],
      answer: answer('tentative', 'trans', '3,4-trans, both groups equatorial.', '9.6 Hz needs H3 and H4 nearly antiperiplanar; the gauche angle of the cis isomer gives a small coupling.'),
      tags: ['ring', 'isomer pair'],
    }),
    acts: [
      { at: at(55, '10:58'), act: 'submit' },
      { at: at(54, '09:20'), act: 'claim', by: 'joris' },
      { at: at(54, '09:34'), act: 'check', by: 'joris', steps: [...allSteps] },
      { at: at(54, '09:40'), act: 'sign', by: 'joris', meaning: 'review' },
      { at: at(20, '14:05'), act: 'addendum', text: 'The isomer pair is complete with PP-004: the second isomer shows 3.1 Hz for the same pair of hydrogens.' },
    ],
  },
  {
    key: 'methyl-cis', project: 'PIP', author: 'tomas', opened: at(25, '13:20'),
    content: content({
      question: '4-Methylpiperidin-3-ol PP-004, second isomer: cis?',
      compound: { name: '1-benzyl-4-methylpiperidin-3-ol, isomer B', batch: 'PP-004-1', notebook: 'TE-043-08', structureNote: 'Second eluting isomer.' },
      conditions: conditions('500.13', 'CDCl3', '298', '15 mM'),
      readings: [reading('r1', ['H3', 'H4'], '3.1', { partner: '3.2', where: '3.74 ppm' }), reading('r2', ['H2a', 'H3'], '2.4', { partner: '2.5', where: '2.72 ppm' })],
      calculations: [singleBond('c1', 'r1', transAt(G.methyl), 'ring'), singleBond('c2', 'r1', cisAt(G.methyl), 'ring')],
      candidates: cisAndTrans(),
      answer: answer('tentative', 'cis', '3,4-cis, H4 equatorial or the other chair.', '3.1 Hz excludes the antiperiplanar angle of the trans isomer with both groups equatorial.', { leftOpen: 'Which of the two chairs of the cis isomer is the larger part.' }),
      tags: ['ring', 'isomer pair'],
    }),
    acts: [
      { at: at(25, '13:50'), act: 'submit' },
      { at: at(22, '10:00'), act: 'claim', by: 'joris' },
      { at: at(22, '10:09'), act: 'check', by: 'joris', steps: [...allSteps] },
      { at: at(22, '10:12'), act: 'sign', by: 'joris', meaning: 'review' },
    ],
  },
  {
    key: 'crystal', project: 'PIP', author: 'tomas', opened: at(19, '09:45'),
    content: content({
      question: '4-Propylpiperidin-3-ol PP-009: relative configuration for the report',
      compound: { name: '1-benzyl-4-propylpiperidin-3-ol hydrochloride', batch: 'PP-009-4', notebook: 'TE-043-16', structureNote: 'Salt, crystals from ethanol.' },
      conditions: conditions('600.30', 'CD3OD', '298', '10 mM'),
      readings: [reading('r1', ['H3', 'H4'], '10.1', { se: '0.1', partner: '10.1', where: '3.52 ppm, td' })],
      calculations: [singleBond('c1', 'r1', transAt(G.ethylChain), 'ring'), singleBond('c2', 'r1', cisAt(G.ethylChain), 'ring')],
      candidates: cisAndTrans(),
      evidence: [evidence('e1', 'x-ray', 'for', 'trans', 'Single crystal of this batch: H–C3–C4–H torsion 174°. Structure in the crystallography log, entry 118.')],
      answer: answer('assigned', 'trans', '3,4-trans, by crystal and coupling.', 'The crystal of the same batch shows the trans isomer, and 10.1 Hz in solution agrees with it.',
        { overrideReason: 'One coupling alone is tentative at most; the crystal structure of this batch decides.' }),
      tags: ['ring', 'X-ray'],
    }),
    acts: [
      { at: at(19, '10:40'), act: 'submit' },
      { at: at(18, '09:05'), act: 'claim', by: 'amina' },
      { at: at(18, '09:22'), act: 'query', by: 'amina', step: 'other-evidence', text: 'Is the crystal from batch 4 or from the seed batch? The override stands on that.' },
      { at: at(18, '10:10'), act: 'reply', query: 1, text: 'From batch 4 itself, the tube and the crystal come from the same filter cake.' },
      { at: at(18, '10:12'), act: 'submit' },
      { at: at(18, '13:30'), act: 'close', by: 'amina', query: 1 },
      { at: at(18, '13:33'), act: 'check', by: 'amina', steps: [...allSteps] },
      { at: at(18, '13:36'), act: 'sign', by: 'amina', meaning: 'approval' },
    ],
  },
  {
    key: 'no-root', project: 'PIP', author: 'tomas', opened: at(4, '15:15'),
    content: content({
      question: 'PP-014: 14.8 Hz at H2ax, which partner?',
      compound: { name: '1-benzyl-4-ethylpiperidin-3-ol', batch: 'PP-014-1', notebook: 'TE-044-14', structureNote: 'Crude after hydrogenation.' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H2ax', 'H3'], '14.8', { where: '1.74 ppm', note: 'Largest splitting of the multiplet; partner not found yet.' })],
      calculations: [singleBond('c1', 'r1', { front: [G.amine, G.h], rear: [G.hydroxy, G.branched] }, 'ring')],
      candidates: [candidate('trans', '3,4-trans', [angle('c1', 155, 205)]), candidate('cis', '3,4-cis', [angle('c1', 40, 75)])],
      tags: ['ring', 'crude'],
    }),
    acts: [{ at: at(3, '08:40'), act: 'comment', by: 'amina', target: 'readings/r1', text: 'No vicinal angle reaches this. The geminal partner H2eq is a fair guess: 12 to 15 Hz is usual there.' }],
  },
  {
    key: 'chain', project: 'PIP', author: 'tomas', opened: at(8, '11:30'),
    content: content({
      question: 'Ring-opened amino alcohol PP-017: syn or anti (zigzag)?',
      compound: { name: '3-(dimethylamino)-4-methylhexan-2-ol', batch: 'PP-017-1', notebook: 'TE-044-05', structureNote: 'Open chain, from the ring opening of PP-003.' },
      conditions: conditions('500.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H2', 'H3'], '6.9', { partner: '6.8', where: '3.86 ppm and 2.31 ppm' })],
      calculations: [singleBond('c1', 'r1', { front: [G.hydroxy, G.methyl], rear: [G.amine, G.branched] }, 'free')],
      candidates: [candidate('syn', 'syn (zigzag)', [], 'OH and N on the same side of the zigzag chain.'), candidate('anti', 'anti (zigzag)', [], 'OH and N on opposite sides of the zigzag chain.')],
      answer: answer('not-decided', null, '6.9 Hz may be an average over rotamers.', '6.9 Hz on a bond that turns may be an average; either isomer can give it.', { leftOpen: '²J(C,H) and ³J(C,H) about the bond, or the cyclic carbamate.' }),
      tags: ['chain'],
    }),
    acts: [{ at: at(8, '12:10'), act: 'submit', dueInDays: -1 }],
  },
  {
    key: 'limit', project: 'PIP', author: 'tomas', opened: at(12, '14:00'),
    content: content({
      question: 'Bicycle PP-020: hydroxyl exo or endo?',
      compound: { name: '2-azabicyclo[2.2.1]heptan-6-ol, N-Boc', batch: 'PP-020-2', notebook: 'TE-043-22', structureNote: 'Rotamers of the carbamate at 298 K; read at 353 K.' },
      conditions: conditions('400.13', 'DMSO-d6', '353'),
      readings: [reading('r1', ['H1', 'H6'], '< 1.5', { where: '4.02 ppm, broad', note: 'No splitting beyond the line width of 1.5 Hz.' })],
      calculations: [singleBond('c1', 'r1', { front: [G.amine, G.branched], rear: [G.hydroxy, G.ethylChain] }, 'ring')],
      candidates: [candidate('exo', 'exo-OH', [angle('c1', 70, 90)], 'H6 endo, about 80° to H1.'), candidate('endo', 'endo-OH', [angle('c1', 35, 55)], 'H6 exo, about 45° to H1.')],
      answer: answer('not-decided', null, 'exo-OH is favoured; the strained ring leaves it open.', 'A coupling below 1.5 Hz fits the angle of endo H6 better, but the ring is strained and the relation was not made for it.', { leftOpen: 'NOE from H6 to the bridge CH2.' }),
      tags: ['bicycle', 'limit'],
    }),
    acts: [
      { at: at(12, '15:10'), act: 'submit', dueInDays: 3 },
      { at: at(11, '09:00'), act: 'claim', by: 'joris' },
      { at: at(11, '09:15'), act: 'query', by: 'joris', step: 'domain', text: 'The equation is asked about a strained bicycle. Does the answer lean on it?' },
      { at: at(1, '11:05'), act: 'reply', query: 1, text: 'No: the statement leaves it open and the plan is the NOE. I kept the calculation to show what it would say.' },
    ],
  },
  {
    key: 'untested', project: 'PIP', author: 'tomas', opened: at(7, '09:05'),
    content: content({
      question: '4-Butylpiperidin-3-ol PP-022: 3,4-cis or trans?',
      compound: { name: '1-benzyl-4-butylpiperidin-3-ol', batch: 'PP-022-1', notebook: 'TE-044-08', structureNote: 'One isomer after chromatography.' },
      conditions: conditions('500.13', 'CDCl3', '298', '20 mM'),
      readings: [
        reading('r1', ['H3', 'H4'], '9.2', { partner: '9.3', where: '3.28 ppm, td' }),
        reading('r2', ['H2ax', 'H3'], '9.4', { partner: '9.5', where: '1.86 ppm' }),
        reading('r3', ['H2eq', 'H3'], '4.3', { partner: '4.2', where: '3.01 ppm' }),
        reading('r4', ['H2ax', 'H2eq'], '10.9', { partner: '11.0', path: '2J', where: '1.86 ppm and 3.01 ppm', note: 'Geminal; size only, the sign was not measured.' }),
        reading('r5', ['H4', 'H5ax'], '11.4', { se: '0.4', where: '1.42 ppm, overlapped' }),
      ],
      calculations: [singleBond('c1', 'r1', transAt(G.ethylChain), 'ring'), singleBond('c2', 'r1', cisAt(G.ethylChain), 'ring')],
      candidates: [...cisAndTrans(), candidate('twist', '3,4-cis, twist form', [], 'The cis isomer out of the chair, by the N-benzyl group.')],
      answer: answer('tentative', 'trans', '3,4-trans, both groups equatorial.', '9.2 Hz needs an angle near 180°; the chair of the cis isomer has none.',
        { overrideReason: 'The calculation stays open because the twist form has no angle to test; five couplings of a chair speak against it.' }),
      tags: ['ring'],
    }),
    acts: [
      { at: at(7, '09:50'), act: 'submit', dueInDays: 0 },
      { at: at(0, '07:10'), act: 'claim', by: 'joris' },
    ],
  },
  {
    key: 'quick-note', project: 'PIP', author: 'tomas', opened: at(1, '17:20'),
    content: content({
      question: 'PP-025: does a splitting of about 7 Hz say anything?',
      compound: { name: 'side product PP-025', batch: 'PP-025-1', notebook: 'TE-044-24', structureNote: '' },
      conditions: conditions('', '', ''),
      readings: [reading('r1', ['Ha', 'Hb'], 'ca. 7', { se: '', note: 'Read off the screen of the spectrometer.' })],
      calculations: [singleBond('c1', 'r1', null, 'unknown')],
      candidates: [],
      tags: [],
    }),
    acts: [],
  },
];
