import { asList, asText } from '../../lib/read';
import { type Adapter, notCovered, unknownKey } from './adapter';
import { askQuickLook } from './quickLook';

type Pair = [string, string];
interface Ends {
  left: Pair;
  right: Pair;
}

/** Cis or trans from one J across CH=CH, with the structure as SMILES or the two groups by their first atoms. */
export const alkeneFromOneJ: Adapter = async (given, api) => {
  const stranger = unknownKey(given, ['J', 'smiles_no_stereo', 'substituents', 'candidates']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  const smiles = asText(given.smiles_no_stereo);
  if (smiles !== undefined) return askQuickLook(api, { bond: 'double', j: given.J, smiles });
  const groups = endsFrom(given.substituents);
  if (groups === undefined) return notCovered(`the substituents ${JSON.stringify(given.substituents)} cannot be put to the product`);
  return askQuickLook(api, { bond: 'double', j: given.J, groups });
};

/** The abstentions about double bonds: by the two groups, or by how many groups the bond carries. */
export const abstention: Adapter = async (given, api) => {
  const stranger = unknownKey(given, ['J', 'coupling', 'alkene', 'substituents']);
  if (stranger !== undefined) return notCovered(`${stranger} has no place in the product yet`);
  const groups = given.substituents === undefined ? crowdedEnds(given.alkene) : endsFrom(given.substituents);
  if (groups === undefined) return notCovered('no double bond is described');
  return askQuickLook(api, { bond: 'double', j: given.J, groups });
};

/** One group on each carbon of CH=CH: `["Br", "C"]`, or in words, `two carbons`. */
export function endsFrom(substituents: unknown): Ends | undefined {
  const named = asList(substituents)?.map(String) ?? (substituents === 'two carbons' ? ['C', 'C'] : undefined);
  const [left, right] = named ?? [];
  return named?.length === 2 && left !== undefined && right !== undefined ? { left: [left, 'H'], right: [right, 'H'] } : undefined;
}

function crowdedEnds(alkene: unknown): Ends | undefined {
  if (alkene === 'trisubstituted') return { left: ['C', 'C'], right: ['C', 'H'] };
  if (alkene === 'tetrasubstituted') return { left: ['C', 'C'], right: ['C', 'C'] };
  return undefined;
}
