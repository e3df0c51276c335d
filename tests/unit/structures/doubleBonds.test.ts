import { findDoubleBonds, resolveAlkene, type DoubleBond } from '@/server/structures/doubleBonds';

async function bonds(smiles: string): Promise<DoubleBond[]> {
  const found = await findDoubleBonds(smiles);
  if ('sentence' in found) throw new Error(found.sentence);
  return found.bonds;
}

describe('the C=C of a SMILES', () => {
  it.each([
    ['but-2-ene', 'CC=CC', ['H', 'C(H,H,H)'], ['H', 'C(H,H,H)'], null],
    ['cinnamic acid', 'O=C(O)C=Cc1ccccc1', ['H', 'C(=O,O)'], ['H', 'C(=C,C)'], null],
    ['β-nitrostyrene', 'O=[N+]([O-])C=Cc1ccccc1', ['H', 'N(=O,O)'], ['H', 'C(=C,C)'], null],
    ['a vinylsilane', 'C[Si](C)(C)C=CC', ['H', 'Si(C,C,C)'], ['H', 'C(H,H,H)'], null],
    ['a sulfone', 'O=S(=O)(C=CC)c1ccccc1', ['H', 'S(=O,=O,C)'], ['H', 'C(H,H,H)'], null],
    ['acrylonitrile', 'C=CC#N', ['H', 'H'], ['H', 'C(#N)'], null],
    ['tiglic acid', 'CC=C(C)C(=O)O', ['H', 'C(H,H,H)'], ['C(H,H,H)', 'C(=O,O)'], null],
    ['2,3-dimethylbut-2-ene', 'CC(C)=C(C)C', ['C(H,H,H)', 'C(H,H,H)'], ['C(H,H,H)', 'C(H,H,H)'], null],
    ['cyclohexene', 'C1=CCCCC1', ['H', 'C(C,H,H)'], ['H', 'C(C,H,H)'], 6],
    ['cyclopropene', 'C1=CC1', ['H', 'C(C,H,H)'], ['H', 'C(C,H,H)'], 3],
    ['cyclododecene', 'C1=CCCCCCCCCCC1', ['H', 'C(C,H,H)'], ['H', 'C(C,H,H)'], 8],
    ['coumarin', 'O=c1ccc2ccccc2o1', ['H', 'C(=O,O)'], ['H', 'C(=C,C)'], 6],
  ] as const)('%s', async (_name, smiles, left, right, ringSize) => {
    const [first] = await bonds(smiles);
    expect(first?.ringSize).toBe(ringSize);
    expect([first?.groups.left, first?.groups.right].map((g) => String(g)).toSorted()).toEqual([left, right].map((g) => String(g)).toSorted());
  });

  it('ignores stereo marks and says so', async () => {
    const marked = await findDoubleBonds('C/C=C\\C');
    const plain = await findDoubleBonds('CC=CC');
    expect(marked).toMatchObject({ note: expect.stringContaining('ignored') as unknown });
    expect('bonds' in marked && 'bonds' in plain && marked.bonds).toEqual('bonds' in plain && plain.bonds);
  });

  it.each([['', 'no atom'], ['c1ccccc1', 'No C=C'], ['c1ccoc1', 'No C=C'], ['CCO', 'No C=C'], ['CC(=O', 'unfinished'], ['C[Si', 'unfinished'], ['C1CC', 'could not be read'], ['not a smiles', 'could not be read'], ['C=C=C', 'No C=C']])('%s is answered in one sentence', async (smiles, words) => {
    const found = await findDoubleBonds(smiles);
    expect('sentence' in found && found.sentence).toContain(words);
  });

  it('takes the only CH=CH, and several as a list to choose from', async () => {
    expect(await resolveAlkene('CC=CCC=C(C)C')).toHaveProperty('bond');
    const several = await resolveAlkene('CC=CC(=O)C=Cc1ccccc1');
    expect('choose' in several && several.choose.map((b) => b.label)).toHaveLength(2);
    // two bonds that differ in nothing the engine sees need no choice
    expect(await resolveAlkene('O=C(C=Cc1ccccc1)C=Cc1ccccc1')).toHaveProperty('bond');
    expect(await resolveAlkene('CC=CCC=CC')).toHaveProperty('bond');
  });
});
