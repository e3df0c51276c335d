import { type DemoCase, at } from '../story';
import { G, answer, candidate, conditions, content, doubleBond, eAndZ, evidence, geometry, reading } from './build';

/** Vinyl linkers, the open cases: hetero atoms at the double bond, a trisubstituted bond, a partner that does not agree. */
export const vinylOpen: DemoCase[] = [
  {
    key: 'enol-ether', project: 'VNL', author: 'tomas', opened: at(9, '08:50'),
    content: content({
      question: 'Enol ether VN-031: E or Z?',
      compound: { name: '1-ethoxy-2-(4-tolyl)ethene', batch: 'VN-031-1', notebook: 'TE-044-02', structureNote: 'EtO–CH=CH–Ar, single spot.' },
      conditions: conditions('400.13', 'C6D6', '298'),
      readings: [reading('r1', ['H1', 'H2'], '12.6', { partner: '12.7', where: '6.95 ppm and 5.83 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.alkoxy, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      answer: answer('not-decided', null, '12.6 Hz is in the open band with oxygen.', 'Oxygen at the double bond lowers both classes, and 12.6 Hz is in the open band. Read as carbon only, the same number would have looked like a high cis value.',
        { leftOpen: 'Look for the other isomer in the mother liquor, or NOE between H1 and H2.' }),
      tags: ['enol ether'],
    }),
    acts: [
      { at: at(9, '09:20'), act: 'submit', dueInDays: 1 },
      { at: at(1, '15:40'), act: 'claim', by: 'amina' },
      { at: at(1, '15:52'), act: 'check', by: 'amina', steps: ['reciprocity', 'domain'] },
    ],
  },
  {
    key: 'vinyl-silane', project: 'VNL', author: 'tomas', opened: at(6, '16:05'),
    content: content({
      question: 'Vinylsilane VN-033 after hydrosilylation: which isomer?',
      compound: { name: '1-(trimethylsilyl)oct-1-ene', batch: 'VN-033-1', notebook: 'TE-044-11', structureNote: 'Me3Si–CH=CH–C6H13.' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H1', 'H2'], '18.5', { partner: '18.4', where: '5.62 ppm and 6.02 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.silyl, G.h], right: [G.ethylChain, G.h] })],
      candidates: eAndZ(),
      tags: ['silane'],
    }),
    acts: [
      { at: at(6, '16:30'), act: 'comment', by: 'joris', target: 'readings/r1', text: 'Silicon raises both: 14.8 Hz would still be cis here. Do we have the other catalyst run to compare with?' },
      { at: at(5, '09:02'), act: 'comment', by: 'tomas', target: 'readings/r1', text: 'The Ru run is on the rotavap. I will add its reading when the spectrum is there.' },
    ],
  },
  {
    key: 'trisubstituted', project: 'VNL', author: 'tomas', opened: at(16, '11:10'),
    content: content({
      question: 'Tiglate-type ester VN-036: E or Z?',
      compound: { name: 'benzyl 2-methyl-3-(2-thienyl)prop-2-enoate', batch: 'VN-036-2', notebook: 'TE-043-20', structureNote: 'Trisubstituted C=C; one vinyl hydrogen.' },
      conditions: conditions('500.13', 'CDCl3', '298', '20 mM'),
      readings: [reading('r1', ['H3', '2-CH3'], '1.3', { se: '0.2', partner: '1.4', path: '4J', where: '2.18 ppm, d', note: 'Allylic. No vicinal coupling crosses this bond.' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.methyl, G.ester], right: [G.aryl, G.h] })],
      candidates: [
        candidate('e', 'E', [geometry('c1', 'trans')], 'Thiophene and ester on opposite sides.'),
        candidate('z', 'Z', [geometry('c1', 'cis')], 'Thiophene and ester on the same side.'),
      ],
      evidence: [
        evidence('e1', 'noe', 'for', 'e', 'No NOE from 2-CH3 to H3 at 600 ms mixing; NOE from 2-CH3 to thienyl H3′ is seen.'),
        evidence('e2', 'literature', 'for', 'e', 'The ester of the parent acid made by the same condensation is described as E; the coupling is not given there.'),
      ],
      answer: answer('tentative', 'e', 'E, from the NOE.', 'The methyl group is near the thiophene ring and not near H3, as in E.',
        { overrideReason: 'The calculation has no vicinal coupling to work with; the NOE decides between the two.', leftOpen: '³J(C,H) from H3 to the ester carbon, about 7 Hz or less in E.' }),
      tags: ['ester', 'NOE'],
    }),
    acts: [
      { at: at(16, '12:00'), act: 'submit', dueInDays: 4 },
      { at: at(14, '10:02'), act: 'claim', by: 'joris' },
      { at: at(14, '10:20'), act: 'check', by: 'joris', steps: ['reciprocity', 'domain', 'second-root'] },
      { at: at(14, '10:26'), act: 'query', by: 'joris', step: 'other-evidence', text: 'An NOE that is absent proves little. Was the T1 of H3 checked, or is there the reverse irradiation?' },
      { at: at(13, '08:15'), act: 'reply', query: 1, text: 'Reverse irradiation is booked for Thursday; ³J(C,H) to the ester carbon goes in the same slot.' },
      { at: at(1, '09:30'), act: 'claim', by: 'joris' },
      { at: at(1, '09:34'), act: 'query', by: 'joris', step: 'alternatives', text: 'For ³J(C,H): which value would make you change to Z? Please write it into "left open".' },
    ],
  },
  {
    key: 'partner-differs', project: 'VNL', author: 'tomas', opened: at(3, '13:45'),
    content: content({
      question: 'Allyl sulfone VN-038: which doublet belongs to H2?',
      compound: { name: '3-(phenylsulfonyl)-1-phenylprop-1-ene', batch: 'VN-038-1', notebook: 'TE-044-17', structureNote: 'PhCH=CH–CH2SO2Ph.' },
      conditions: conditions('300.13', 'CDCl3', '298'),
      readings: [
        reading('r1', ['H1', 'H2'], '15.8', { partner: '14.6', where: '6.36 ppm and 6.10 ppm', note: '14.6 at H2 is read between overlapping lines.' }),
        reading('r2', ['H2', 'H3'], '7.5', { partner: '7.6', where: '3.94 ppm' }),
      ],
      calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: ['C(S,H,H)', G.h] })],
      candidates: eAndZ(),
      tags: ['sulfone'],
    }),
    acts: [{ at: at(2, '10:10'), act: 'comment', by: 'amina', target: 'readings/r1', text: 'The two ends differ by 1.2 Hz. Is 14.6 really the same splitting, or the distance to a line of the next signal?' }],
  },
  {
    key: 'vinyl-bromide', project: 'VNL', author: 'tomas', opened: at(34, '09:30'),
    content: content({
      question: 'Vinyl bromide VN-024: E or Z?',
      compound: { name: '1-bromo-2-(4-methoxyphenyl)ethene', batch: 'VN-024-1', notebook: 'TE-042-12', structureNote: 'ArCH=CHBr.' },
      conditions: conditions('400.13', 'CDCl3', '298'),
      readings: [reading('r1', ['H1', 'H2'], '13.9', { partner: '13.9', where: '6.60 ppm and 7.03 ppm' })],
      calculations: [doubleBond('c1', 'r1', { left: [G.bromo, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      answer: answer('not-decided', null, '13.9 Hz is in the open band with bromine.', '13.9 Hz with bromine at the double bond is in the open band.', { leftOpen: 'The Z isomer from the other route, for comparison.' }),
      tags: ['halide'],
    }),
    acts: [
      { at: at(34, '10:00'), act: 'submit' },
      { at: at(33, '09:00'), act: 'withdraw', reason: 'The tube was labelled VN-024 but held VN-023; the spectrum belongs to another compound.' },
    ],
  },
  {
    key: 'vinyl-fluoride', project: 'VNL', author: 'joris', opened: at(5, '10:35'),
    content: content({
      question: 'β-Fluorostyrene VN-040: E or Z?',
      compound: { name: '1-fluoro-2-(4-biphenylyl)ethene', batch: 'VN-040-1', notebook: 'JC-012-05', structureNote: 'ArCH=CHF from the phosphonium salt; ratio about 3 : 1, this is the major isomer.' },
      conditions: conditions('500.13', 'CDCl3', '298'),
      readings: [
        reading('r1', ['H1', 'H2'], '11.3', { partner: '11.4', where: '7.20 ppm and 6.42 ppm' }),
        reading('r2', ['H2', 'F'], '19.3', { se: '0.3', nuclei: '1H,19F', where: '6.42 ppm, second doublet', note: 'Kept as evidence; no relation for ³J(H,F) is held yet.' }),
      ],
      calculations: [doubleBond('c1', 'r1', { left: [G.fluoro, G.h], right: [G.aryl, G.h] })],
      candidates: eAndZ(),
      evidence: [evidence('e1', 'other-coupling', 'for', 'e', '³J(H,F) 19.3 Hz: published β-fluorostyrenes show about 19 Hz in E and about 44 Hz in Z.')],
      answer: answer('not-decided', null, 'Open by ³J(H,H) alone.', 'With fluorine at the double bond 11.3 Hz is in the open band.', { leftOpen: 'The minor isomer of the 3 : 1 mixture, and ³J(H,F) when a relation for it is held.' }),
      tags: ['fluoride'],
    }),
    acts: [{ at: at(5, '11:20'), act: 'submit', dueInDays: 2 }],
  },
  {
    key: 'bisvinyl', project: 'VNL', author: 'tomas', opened: at(2, '16:30'),
    content: content({
      question: 'Dienamide VN-042: geometry of both double bonds?',
      compound: { name: 'N-isobutyl-5-phenylpenta-2,4-dienamide', batch: 'VN-042-1', notebook: 'TE-044-21', structureNote: 'PhCH=CH–CH=CH–C(O)NHR.' },
      conditions: conditions('600.30', 'CDCl3', '298', '10 mM'),
      readings: [
        reading('r1', ['H2', 'H3'], '14.9', { se: '0.1', partner: '14.9', where: '5.98 ppm and 7.40 ppm' }),
        reading('r2', ['H3', 'H4'], '10.7', { se: '0.1', partner: '10.8', where: '7.40 ppm and 6.87 ppm', note: 'Across the single bond of the diene; says nothing of E or Z.' }),
        reading('r3', ['H4', 'H5'], '15.6', { se: '0.1', partner: '15.5', where: '6.87 ppm and 6.81 ppm', note: 'Close in shift at 300 MHz; read at 600.' }),
      ],
      calculations: [
        doubleBond('c1', 'r1', { left: [G.amide, G.h], right: ['C(=C,H)', G.h] }),
        doubleBond('c2', 'r3', { left: ['C(=C,H)', G.h], right: [G.aryl, G.h] }),
      ],
      candidates: [
        candidate('ee', '2E,4E', [geometry('c1', 'trans'), geometry('c2', 'trans')]),
        candidate('ze', '2Z,4E', [geometry('c1', 'cis'), geometry('c2', 'trans')]),
        candidate('ez', '2E,4Z', [geometry('c1', 'trans'), geometry('c2', 'cis')]),
        candidate('zz', '2Z,4Z', [geometry('c1', 'cis'), geometry('c2', 'cis')]),
      ],
      tags: ['amide', 'diene'],
    }),
    acts: [],
  },
];
